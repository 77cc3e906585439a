import { useSuspenseQuery } from "@tanstack/react-query";
import { Suspense } from "react";
import type { PublishedEdition } from "#shared/contracts/editions.ts";
import { materialLabels, materials, processGases, processGasLabels } from "#shared/materials/materials.ts";
import { formatDate } from "#shared/units/dates.ts";
import { currentEditionQuery } from "../../lib/edition-queries.ts";
import { useUrlState } from "../../lib/use-url-state.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { BookAgainstPeers } from "./book-against-peers.tsx";
import { MapSection } from "./map-section.tsx";
import { NoEditionYet } from "./no-edition-yet.tsx";

const defaults = { metal: "mild-steel", gas: "air" };

/** Where the network has figures, and how the own book lies among them. */
export function PeerMapPage() {
  const { edition } = useSuspenseQuery(currentEditionQuery).data;
  const { shop } = useSession();
  const start = (
    <ButtonLink to="/start" kind="primary">
      Make a starting recipe
    </ButtonLink>
  );
  return (
    <>
      <PageHeader
        title="Peers"
        facts={edition ? `What shops set, without names · edition of ${formatDate(edition.date)}` : null}
        actions={shop ? start : null}
      />
      {edition ? <MetalMap edition={edition} /> : <NoEditionYet />}
      {edition && shop?.state === "active" ? (
        <section aria-labelledby="book" className="mt-12">
          <h2 id="book" className="text-xl font-black">
            My book against peers
          </h2>
          <Suspense fallback={<Skeleton lines={6} />}>
            <BookAgainstPeers most={8} />
          </Suspense>
        </section>
      ) : null}
    </>
  );
}

function MetalMap({ edition }: { edition: PublishedEdition }) {
  const [state, change] = useUrlState(defaults);
  const material = materials.find((name) => name === state.metal) ?? "mild-steel";
  const gas = processGases.find((name) => name === state.gas) ?? "air";
  return (
    <section aria-label="Map of peer groups">
      <div className="mb-6 grid max-w-lg grid-cols-2 gap-4 print:hidden">
        <SelectField
          label="Metal"
          value={material}
          onChange={(event) => change({ metal: event.target.value })}
          choices={materials.map((value) => ({ value, label: materialLabels[value] }))}
        />
        <SelectField
          label="Process gas"
          value={gas}
          onChange={(event) => change({ gas: event.target.value })}
          choices={processGases.map((value) => ({ value, label: processGasLabels[value] }))}
        />
      </div>
      <MapSection edition={edition} material={material} gas={gas} />
    </section>
  );
}
