import type { ReactNode } from "react";
import type { Recipe } from "#shared/contracts/recipes.ts";
import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { countWords } from "#shared/peers/count-words.ts";
import { bandNominalMm } from "#shared/peers/peer-group.ts";
import { ButtonLink } from "../../ui/button.tsx";
import { Skeleton } from "../../ui/skeleton.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { CheckFirst } from "./check-first.tsx";
import { acceptableWords } from "./peer-words.ts";

export interface GroupAsideProps {
  figures: PeerGroupFigures;
  own: Recipe | undefined;
  /** Whether it is known yet which recipes are in the book. */
  known: boolean;
}

/** Beside the strips: what to make of them and where to go from here. */
export function GroupAside({ figures, own, known }: GroupAsideProps) {
  return (
    <aside className="space-y-4" aria-label="What to make of it">
      {figures.status === "released" ? (
        <Panel title="What to check first">
          {known ? <CheckFirst group={figures} own={own} /> : <Skeleton lines={3} />}
        </Panel>
      ) : null}
      <ButtonLink to={startHref(figures, own)} kind="primary" className="w-full print:hidden">
        Make a starting recipe
      </ButtonLink>
      {own ? (
        <ButtonLink to={`/recipes/${own.id}`} className="w-full print:hidden">
          Open your recipe
        </ButtonLink>
      ) : null}
      {figures.status === "released" ? (
        <Panel title="Behind these figures">
          <p>{acceptableWords(figures.acceptableShare)}</p>
          <p>
            {countWords(figures.shops)} with {countWords(figures.recipes, "recipes")}; each shop counts as one.
          </p>
          <p>
            They report what shops do and are no instruction. <TextLink to="/method">How they are made</TextLink> ·{" "}
            <TextLink to="/cautions">Cautions</TextLink>
          </p>
        </Panel>
      ) : null}
    </aside>
  );
}

function Panel({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section data-keep-together="" className="rounded border border-line bg-surface p-4">
      <h2 className="font-bold">{title}</h2>
      <div className="mt-1 space-y-3 text-sm text-soft">{children}</div>
    </section>
  );
}

/** The own sheet where there is one, else the size the band is named after. */
function startHref({ key }: PeerGroupFigures, own: Recipe | undefined): string {
  const content = own?.version.content;
  const query = new URLSearchParams({
    metal: key.material,
    thickness: String(content?.thicknessMm ?? bandNominalMm(key.bandIndex)),
    nozzle: String(key.nozzleMm),
    ...(key.gas === "air" ? {} : { gas: key.gas }),
    ...(content ? { machine: content.machineId } : {}),
  });
  return `/start?${query}`;
}
