import type { Edition } from "#shared/contracts/editions.ts";
import { formatDate } from "#shared/units/dates.ts";
import { formatCount } from "#shared/units/format.ts";
import { StateWord } from "../../ui/notice.tsx";
import { ChangesSummary, changesInShort } from "./changes-summary.tsx";

/** Every other edition, newest first; what it changed opens below its line. */
export function EditionList({ editions }: { editions: readonly Edition[] }) {
  const current = editions.find((edition) => edition.state === "published");
  return (
    <section>
      <h2 className="mb-3 text-lg font-bold">Editions so far</h2>
      <ol className="border-t border-line">
        {editions.map((edition) => (
          <li key={edition.id} className="border-b border-line">
            <EditionLine edition={edition} current={edition === current} />
          </li>
        ))}
      </ol>
    </section>
  );
}

function EditionLine({ edition, current }: { edition: Edition; current: boolean }) {
  return (
    <details className="group">
      <summary className="grid min-h-touch items-center gap-x-6 gap-y-1 py-3 hover:bg-surface md:grid-cols-[7rem_8rem_16rem_1fr]">
        <span className="font-bold">Edition {edition.number}</span>
        <EditionState edition={edition} current={current} />
        <span className="figures text-soft">
          {edition.publishedAt ? "Published" : "Built"} {formatDate(edition.publishedAt ?? edition.builtAt)}
        </span>
        <span className="text-soft">
          {formatCount(edition.releasedGroups)} groups shown: {changesInShort(edition.changes)}{" "}
          <span className="text-action underline underline-offset-2 group-open:hidden">What changed</span>
        </span>
      </summary>
      <div className="pb-5 md:pl-[8.5rem]">
        <ChangesSummary changes={edition.changes} />
      </div>
    </details>
  );
}

function EditionState({ edition, current }: { edition: Edition; current: boolean }) {
  if (current) return <StateWord kind="sound">Current</StateWord>;
  if (edition.state === "published") return <span className="text-muted">Replaced</span>;
  if (edition.state === "built") return <StateWord kind="watch">Built</StateWord>;
  return <span className="text-muted">Discarded</span>;
}
