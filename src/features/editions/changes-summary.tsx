import type { EditionChanges } from "#shared/contracts/editions.ts";
import { formatCount } from "#shared/units/format.ts";
import { groupsByMetal } from "./group-names.ts";

type Kind = Exclude<keyof EditionChanges, "unchanged">;

const kinds: { kind: Kind; one: string; many: string; means: string }[] = [
  { kind: "appeared", one: "appears", many: "appear", means: "Enough shops are in them now." },
  { kind: "changed", one: "changes", many: "change", means: "New figures, from three changed shops or more." },
  {
    kind: "held",
    one: "is held",
    many: "are held",
    means: "Too few shops changed: the figures of the edition before stay, with its date.",
  },
  { kind: "withheld", one: "is withheld", many: "are withheld", means: "Shown before, and no longer safe to show." },
];

const groupWord = (count: number) => `${formatCount(count)}\u00a0${count === 1 ? "group" : "groups"}`;

/** All that publishing would change for the members, by the names of the groups. Counts of shops are nowhere in it. */
export function ChangesSummary({ changes }: { changes: EditionChanges }) {
  const present = kinds.filter(({ kind }) => changes[kind].length > 0);
  return (
    <div className="space-y-4">
      {present.length === 0 ? <p>No group changes.</p> : null}
      {present.map(({ kind, one, many, means }) => (
        <section key={kind}>
          <h3 className="font-bold">
            {groupWord(changes[kind].length)} {changes[kind].length === 1 ? one : many}
          </h3>
          <p className="text-sm text-muted">{means}</p>
          <dl className="mt-1 text-sm">
            {groupsByMetal(changes[kind]).map(({ metal, groups }) => (
              <div key={metal} className="grid gap-x-4 border-t border-line py-1.5 sm:grid-cols-[10rem_1fr]">
                <dt className="font-bold">{metal}</dt>
                <dd className="text-soft">{groups.map(({ name }) => name).join(" · ")}</dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
      {changes.unchanged > 0 ? (
        <p className="text-soft">
          {groupWord(changes.unchanged)} {changes.unchanged === 1 ? "stays as it was" : "stay as they were"}.
        </p>
      ) : null}
    </div>
  );
}

/** "3 appear, 1 is held", for one line in a list. */
export function changesInShort(changes: EditionChanges): string {
  const said = kinds.flatMap(({ kind, one, many }) => {
    const count = changes[kind].length;
    return count === 0 ? [] : [`${formatCount(count)}\u00a0${count === 1 ? one : many}`];
  });
  return said.length === 0 ? "no group changes" : said.join(", ");
}
