import { randomUUID } from "node:crypto";
import type { EditionRef, ListedRecipe, MachineTraits, PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import { compareMarks, type Digest, type GroupMemory, ledgerOf } from "#shared/disclosure/ledger.ts";
import { namelessCopy, shownListings } from "#shared/disclosure/listed-recipe.ts";
import type { DisclosureParameters } from "#shared/disclosure/parameters.ts";
import { releaseGroup } from "#shared/disclosure/release.ts";
import { rememberRelease } from "#shared/disclosure/remember-release.ts";
import type { Contribution } from "#shared/peers/contribution.ts";
import { peerGroupId } from "#shared/peers/peer-group.ts";
import { metrics } from "#shared/recipes/metrics.ts";

/** A contribution with what only its nameless copy may need. */
export interface SharedRecipe extends Contribution {
  listed: boolean;
  publicText: string;
  /** ISO 8601 date of the test cut that proved it. */
  provenOn: string;
  traits: MachineTraits;
}

/** What the group said in the last published edition, and what the step must remember of it. */
export interface GroupBefore {
  memory: GroupMemory | null;
  wasReleased: boolean;
}

export type GroupChange = "appeared" | "changed" | "held" | "withheld" | "unchanged" | "absent";

export interface BuiltGroup {
  figures: PeerGroupFigures;
  listed: ListedRecipe[];
  memory: GroupMemory | null;
  change: GroupChange;
}

export interface BuildRules {
  parameters: DisclosureParameters;
  edition: EditionRef;
  digest: Digest;
}

/** The builder knows no name to look for: names were looked for when the text was typed. */
const noNames = { shop: "", people: [] };

/** All that an edition says and remembers of one group. */
export function buildGroup(recipes: readonly SharedRecipe[], before: GroupBefore, rules: BuildRules): BuiltGroup {
  const { parameters, edition, digest } = rules;
  const figures = releaseGroup(recipes, before.memory, parameters, edition, digest);
  return {
    figures,
    listed: listingsOf(recipes, figures, parameters),
    memory: rememberRelease(recipes, before.memory, parameters, figures, digest),
    change: changeOf(recipes, before, figures, rules),
  };
}

function listingsOf(
  recipes: readonly SharedRecipe[],
  figures: PeerGroupFigures,
  parameters: DisclosureParameters,
): ListedRecipe[] {
  const groupId = peerGroupId(figures.key);
  const listings = recipes
    .filter(({ listed }) => listed)
    .map((recipe) => {
      const { material, nozzleMm, gas } = recipe.key;
      const { thicknessMm, setpoints, traits, provenOn: changedAt, publicText: text } = recipe;
      const source = { material, nozzleMm, gas, thicknessMm, setpoints, traits, changedAt, text };
      const copy = namelessCopy(source, recipes, noNames, parameters);
      return { shop: recipe.shop, groupId, recipe: { id: randomUUID(), ...copy } };
    });
  return shownListings(figures, listings, parameters);
}

function changeOf(
  recipes: readonly SharedRecipe[],
  { memory, wasReleased }: GroupBefore,
  figures: PeerGroupFigures,
  { edition, digest }: BuildRules,
): GroupChange {
  if (figures.status === "withheld") return wasReleased ? "withheld" : "absent";
  if (!wasReleased) return "appeared";
  const from = [figures.figuresFrom, ...metrics.map((metric) => figures.distributions[metric]?.figuresFrom)];
  if (from.some((ref) => ref?.number === edition.number)) return "changed";
  const given = compareMarks(memory?.ledger.whole ?? {}, ledgerOf(recipes, digest).whole);
  return given.changed.size > 0 ? "held" : "unchanged";
}
