import type { Edition, PublishedEdition } from "#shared/contracts/editions.ts";
import { EditionChanges } from "#shared/contracts/editions.ts";
import { type EditionRef, PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { metrics } from "#shared/recipes/metrics.ts";
import type { EditionRow } from "./editions.queries.ts";

const dayOf = (time: Date): string => time.toISOString().slice(0, 10);

/** An edition goes by the day it came out; one that has not come out yet by the day it was built. */
export function presentPublished(row: EditionRow): PublishedEdition {
  return { id: row.id, number: row.number, date: dayOf(row.publishedAt ?? row.builtAt) };
}

export function presentEdition(row: EditionRow): Edition {
  return {
    ...presentPublished(row),
    state: row.state,
    builtAt: row.builtAt.toISOString(),
    publishedAt: row.publishedAt?.toISOString() ?? null,
    releasedGroups: row.releasedGroups,
    changes: EditionChanges.parse(row.changes),
  };
}

/**
 * Figures as kept, with the publication day wherever they name an edition: it was not known yet when they were computed.
 * @param days  by edition number
 */
export function presentFigures(kept: unknown, days: ReadonlyMap<number, string>): PeerGroupFigures {
  const figures = PeerGroupFigures.parse(kept);
  if (figures.status === "withheld") return figures;
  const dated = (ref: EditionRef) => ({ ...ref, date: days.get(ref.number) ?? ref.date });
  const distributions = { ...figures.distributions };
  for (const metric of metrics) {
    const distribution = distributions[metric];
    if (distribution) distributions[metric] = { ...distribution, figuresFrom: dated(distribution.figuresFrom) };
  }
  return { ...figures, figuresFrom: dated(figures.figuresFrom), distributions };
}

/** For lists: the curves are most of a group's size. */
export function withoutDensity(figures: PeerGroupFigures): PeerGroupFigures {
  if (figures.status === "withheld") return figures;
  const distributions = { ...figures.distributions };
  for (const metric of metrics) {
    const distribution = distributions[metric];
    if (distribution) distributions[metric] = { ...distribution, density: null };
  }
  return { ...figures, distributions };
}
