import { useQuery } from "@tanstack/react-query";
import { lazy, Suspense } from "react";
import type { PublishedEdition } from "#shared/contracts/editions.ts";
import { type Material, materialLabels, type ProcessGas, processGasLabels } from "#shared/materials/materials.ts";
import { peerGroupOf } from "#shared/peers/peer-group.ts";
import { editionMaterialQuery } from "../../lib/edition-queries.ts";
import { peerSubjectOf } from "../../lib/recipe-words.ts";
import { useSession } from "../../shell/session.queries.ts";
import { Notice } from "../../ui/notice.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { type MapLayout, mapLayout } from "./map-layout.ts";
import { MapLegend } from "./map-legend.tsx";
import { MapTable } from "./map-table.tsx";
import { ownRecipesQuery } from "./peers.queries.ts";

const PeerMap = lazy(() => import("./peer-map.tsx").then((module) => ({ default: module.PeerMap })));

interface MapSectionProps {
  edition: PublishedEdition;
  material: Material;
  gas: ProcessGas;
}

/** The map of one metal and gas with its legend and its table. */
export function MapSection({ edition, material, gas }: MapSectionProps) {
  const { units, shop } = useSession();
  const { data } = useQuery({ ...editionMaterialQuery(edition.id, material, gas), throwOnError: true });
  const own = useQuery({ ...ownRecipesQuery(material), enabled: shop?.state === "active", throwOnError: true });
  const ownKeys = (own.data ?? []).map(({ version }) => peerGroupOf(peerSubjectOf(version.content)));
  if (!data) return <Skeleton lines={12} />;
  const { groups } = data;
  const layout = mapLayout({ material, gas, groups, own: ownKeys.filter((key) => key.gas === gas) });
  const shops = groups.flatMap((group) => (group.status === "released" ? [group.shops] : []));
  return (
    <div className="grid gap-6 md:grid-cols-[minmax(0,1fr)_16rem] md:gap-10">
      <div className="min-w-0">
        {shops.length === 0 ? <NothingShown material={material} gas={gas} /> : null}
        <LazyMap
          layout={layout}
          label={`${materialLabels[material]} cut with ${processGasLabels[gas].toLowerCase()}`}
        />
      </div>
      <aside className="space-y-4 md:pt-11" aria-label="Reading the map">
        <MapLegend shown={shops} />
        <p className="text-sm text-soft">
          A band holds the sheets that cut alike: the 3.15 band takes 3 mm, 1/8 in and 11 ga together. Open a square for
          its figures. <TextLink to="/method">How the figures are made</TextLink>
        </p>
      </aside>
      <details className="md:col-span-2">
        <summary className="font-bold text-action">The map as a table</summary>
        <MapTable layout={layout} units={units} />
      </details>
    </div>
  );
}

function LazyMap({ layout, label }: { layout: MapLayout; label: string }) {
  const { units } = useSession();
  return (
    <Suspense fallback={<Skeleton lines={10} />}>
      <PeerMap layout={layout} label={`Map of peer groups: ${label}`} units={units} />
    </Suspense>
  );
}

function NothingShown({ material, gas }: { material: Material; gas: ProcessGas }) {
  return (
    <Notice title={`No group of ${materialLabels[material].toLowerCase()} is shown yet`} className="mb-4">
      <p>
        With {processGasLabels[gas].toLowerCase()} no thickness and nozzle has enough shops to hide who set what. A
        square opens all the same and offers a starting recipe.
      </p>
    </Notice>
  );
}
