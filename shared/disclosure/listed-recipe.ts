import type { ListedRecipe, MachineTraits, PeerGroupFigures } from "../contracts/released-figures.ts";
import { nozzleStep, type PeerGroupSubject, peerGroupId } from "../peers/peer-group.ts";
import type { Setpoints } from "../recipes/metrics.ts";
import type { DisclosureParameters } from "./parameters.ts";
import { distinctShops } from "./quorum.ts";
import { roundSetpoints, roundThickness } from "./rounding.ts";
import { type OwnNames, screenText } from "./text-screening.ts";

/** A recipe its shop lists, before it loses its name. */
export interface ListingSource extends PeerGroupSubject {
  setpoints: Setpoints;
  /** ISO 8601 date or time of the version, UTC. */
  changedAt: string;
  /** What the owner typed for sharing; empty for nothing. */
  text: string;
  traits: MachineTraits;
}

/** A machine among those that contribute to the group, as far as traits go. */
export interface ContributingMachine {
  shop: number;
  traits: MachineTraits;
}

/** A calendar quarter such as "2026-Q3": an exact time would match what a shop says elsewhere. */
export function quarterOf(isoDate: string): string {
  const [, year, month] = /^(\d{4})-(\d{2})/.exec(isoDate) ?? [];
  if (!year || !(Number(month) >= 1 && Number(month) <= 12)) throw new RangeError("quarterOf needs an ISO 8601 date");
  return `${year}-Q${Math.ceil(Number(month) / 3)}`;
}

/**
 * The nameless copy of a listed recipe: rounded, dated to the quarter, with a machine trait only where enough shops of the
 * group share it. Text that fails the screening is left out, whatever was let through when it was typed.
 * @param machines  those behind the group's contributions, the listing's own among them
 */
export function namelessCopy(
  source: ListingSource,
  machines: readonly ContributingMachine[],
  own: OwnNames,
  parameters: Pick<DisclosureParameters, "traitShops">,
): Omit<ListedRecipe, "id"> {
  const text = source.text.trim();
  return {
    material: source.material,
    thicknessMm: roundThickness(source.thicknessMm),
    nozzleMm: nozzleStep(source.nozzleMm),
    gas: source.gas,
    setpoints: roundSetpoints(source.setpoints),
    quarter: quarterOf(source.changedAt),
    text: text !== "" && screenText(text, own).length === 0 ? text : null,
    traits: sharedTraits(source.traits, machines, parameters),
  };
}

function sharedTraits(
  traits: MachineTraits,
  machines: readonly ContributingMachine[],
  parameters: Pick<DisclosureParameters, "traitShops">,
): MachineTraits {
  const isShared = (name: keyof MachineTraits) =>
    traits[name] !== null &&
    distinctShops(machines.filter((m) => m.traits[name] === traits[name])) >= parameters.traitShops;
  return {
    startMethod: isShared("startMethod") ? traits.startMethod : null,
    dryness: isShared("dryness") ? traits.dryness : null,
    heightControl: isShared("heightControl") ? traits.heightControl : null,
  };
}

/**
 * The listed recipes a group shows: none unless its figures are released and enough shops list there. Ordered by their
 * figures, the random id last, so that the order tells nothing of who came when.
 */
export function shownListings(
  figures: PeerGroupFigures,
  listings: readonly { shop: number; groupId: string; recipe: ListedRecipe }[],
  parameters: Pick<DisclosureParameters, "listingShops">,
): ListedRecipe[] {
  const id = peerGroupId(figures.key);
  const here = listings.filter(({ groupId }) => groupId === id); // its rounded thickness may lie in the next band
  if (figures.status !== "released" || distinctShops(here) < parameters.listingShops) return [];
  return here.map(({ recipe }) => recipe).sort(byFigures);
}

/** By what the recipes say, the random id last. */
export function byFigures(a: ListedRecipe, b: ListedRecipe): number {
  const figuresOf = ({ thicknessMm, setpoints: s }: ListedRecipe) => [
    thicknessMm,
    s.feedMmMin ?? 0,
    s.currentA ?? 0,
    s.arcVoltageV ?? 0,
  ];
  const [left, right] = [figuresOf(a), figuresOf(b)];
  const at = left.findIndex((figure, i) => figure !== right[i]);
  return at < 0 ? (a.id < b.id ? -1 : 1) : left[at]! - right[at]!;
}
