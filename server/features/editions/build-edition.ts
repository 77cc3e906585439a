import { createHash } from "node:crypto";
import type { Db } from "#server/db/client.ts";
import type { EditionChanges } from "#shared/contracts/editions.ts";
import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import type { DisclosureParameters } from "#shared/disclosure/parameters.ts";
import { networkFigures } from "#shared/peers/network-figures.ts";
import { type PeerGroupKey, peerGroupId } from "#shared/peers/peer-group.ts";
import { forEachMetric } from "#shared/recipes/metrics.ts";
import * as queries from "./build-edition.queries.ts";
import { type BuiltGroup, buildGroup, type GroupBefore, type SharedRecipe } from "./build-group.ts";
import { canonicalJson } from "./canonical-json.ts";
import { fingerprintOf, marksBy } from "./marks.ts";

export interface BuildOptions {
  /** The edition takes the id of the build that makes it. */
  id: string;
  /** UTC. Shown until the edition is published, and then replaced by the day of that. */
  today: string;
  marksKey: string;
  parameters: DisclosureParameters;
  onProgress: (groupsDone: number, groupsTotal: number) => Promise<void>;
}

/** What an edition was built under; kept with it. */
export interface BuiltUnder {
  disclosure: DisclosureParameters;
  marksKey: string;
  /** The published edition it was compared with. */
  comparedWith: string | null;
}

/** Marks made with another key would all look changed, and the three-shop step would let everything through. */
export class OtherMarksKeyError extends Error {}

/**
 * Builds an edition: every group through the disclosure rules, one at a time. The caller gives a repeatable-read
 * transaction: the edition is one snapshot of the network, and there whole or not at all.
 */
export async function buildEdition(tx: Db, options: BuildOptions): Promise<{ number: number }> {
  const last = await queries.findLastPublished(tx);
  const fingerprint = fingerprintOf(options.marksKey);
  if (last && (last.parameters as BuiltUnder).marksKey !== fingerprint) throw new OtherMarksKeyError();
  const number = await queries.nextEditionNumber(tx);
  const builtUnder: BuiltUnder = {
    disclosure: options.parameters,
    marksKey: fingerprint,
    comparedWith: last?.id ?? null,
  };
  const summary = new Summary();
  await queries.insertEdition(tx, { id: options.id, number, parameters: builtUnder, ...summary.soFar() });
  await queries.dropOldMemories(tx, last?.id ?? null);
  await queries.emptyDiscarded(tx);

  const edition = { number, date: options.today };
  const rules = { parameters: options.parameters, edition, digest: marksBy(options.marksKey) };
  const keys = await queries.listGroups(tx, last?.id ?? null);
  const contributions = takeByGroup(queries.readContributions(tx));
  for (const [done, key] of keys.entries()) {
    await options.onProgress(done, keys.length);
    const groupId = peerGroupId(key);
    const built = buildGroup(await contributions(groupId), await findBefore(tx, last?.id, groupId), rules);
    await keep(tx, options.id, key, built);
    summary.add(key, built);
  }
  await options.onProgress(keys.length, keys.length);
  await queries.completeEdition(tx, options.id, summary.soFar());
  return { number };
}

/** Groups come from the reader in the order they are asked for; one that nobody contributes to is not there. */
function takeByGroup(reader: AsyncGenerator<{ groupId: string; recipes: SharedRecipe[] }>) {
  let next: Promise<IteratorResult<{ groupId: string; recipes: SharedRecipe[] }>> | undefined;
  return async (groupId: string): Promise<SharedRecipe[]> => {
    next ??= reader.next();
    const { value, done } = await next;
    if (done || value.groupId !== groupId) return [];
    next = undefined;
    return value.recipes;
  };
}

async function findBefore(tx: Db, lastId: string | undefined, groupId: string): Promise<GroupBefore> {
  const before = lastId === undefined ? undefined : await queries.findGroupBefore(tx, lastId, groupId);
  return { memory: before?.memory ?? null, wasReleased: before?.status === "released" };
}

/** A group without a quorum leaves no row: even a row that says "too few" would say that somebody is there. */
async function keep(tx: Db, editionId: string, key: PeerGroupKey, { figures, listed, memory }: BuiltGroup) {
  const isSaid = figures.status === "released" || figures.reason !== "quorum";
  if (isSaid) await queries.insertGroup(tx, editionId, figures);
  if (listed.length > 0) await queries.insertListed(tx, editionId, peerGroupId(key), listed);
  if (memory) await queries.insertMemory(tx, editionId, key, memory);
}

/** What goes with the edition as a whole, gathered as its groups pass. */
class Summary {
  private readonly hash = createHash("sha256");
  private readonly released: ReleasedGroup[] = [];
  private readonly changes: EditionChanges = { appeared: [], changed: [], held: [], withheld: [], unchanged: 0 };

  add(key: PeerGroupKey, { figures, listed, change }: BuiltGroup): void {
    if (figures.status === "released") this.released.push(withoutCurves(figures));
    if (figures.status === "released" || figures.reason !== "quorum") {
      this.hash.update(`${canonicalJson({ figures, listed })}\n`);
    }
    if (change === "unchanged") this.changes.unchanged += 1;
    else if (change !== "absent") this.changes[change].push(key);
  }

  /** @returns the digest of everything released, one line of canonical JSON a group and one for the network */
  soFar() {
    const network = networkFigures(this.released);
    const digest = this.hash
      .copy()
      .update(`${canonicalJson(network)}\n`)
      .digest("hex");
    return { digest, networkFigures: network, changes: this.changes, releasedGroups: this.released.length };
  }
}

/** The curves are most of a group's size, and nothing about the network is made from them. */
function withoutCurves(group: ReleasedGroup): ReleasedGroup {
  const distributions = forEachMetric((metric) => {
    const distribution = group.distributions[metric];
    return distribution && { ...distribution, density: null };
  });
  return { ...group, distributions };
}
