import { createHash } from "node:crypto";
import type { Db } from "#server/db/client.ts";
import { ProblemError } from "#server/http/problem.ts";
import type { PublishedEdition } from "#shared/contracts/editions.ts";
import {
  ListedRecipe,
  NetworkFigures,
  type PeerGroupFigures,
  type ReleasedGroup,
} from "#shared/contracts/released-figures.ts";
import { byFigures } from "#shared/disclosure/listed-recipe.ts";
import type { Material, ProcessGas } from "#shared/materials/materials.ts";
import { parsePeerGroupId } from "#shared/peers/peer-group.ts";
import * as queries from "./editions.queries.ts";
import { presentFigures, presentPublished, withoutDensity } from "./released.ts";

/** What an edition says is read once it is published, by nobody before. */
async function requireEdition(tx: Db, id: string): Promise<queries.EditionRow> {
  const row = await queries.findEdition(tx, id);
  if (row?.state !== "published") throw new ProblemError("not-found", { detail: "There is no such edition" });
  return row;
}

export async function findCurrentEdition(tx: Db): Promise<PublishedEdition | null> {
  const row = await queries.findLastPublished(tx);
  return row ? presentPublished(row) : null;
}

/** Names what an answer made from an edition says: changes with what it released, its day, and the address asked for. */
export async function etagOf(tx: Db, id: string, address: string): Promise<string> {
  const row = await requireEdition(tx, id);
  return createHash("sha256")
    .update(`${row.digest} ${presentPublished(row).date} ${address}`)
    .digest("base64url");
}

export async function readMaterial(tx: Db, id: string, material: Material, gas: ProcessGas) {
  const row = await requireEdition(tx, id);
  const days = await queries.listPublicationDays(tx);
  const kept = await queries.listGroupFigures(tx, id, material, gas);
  return {
    edition: presentPublished(row),
    groups: kept.map((figures) => withoutDensity(presentFigures(figures, days))),
    network: NetworkFigures.parse(row.networkFigures),
  };
}

export async function readGroup(tx: Db, id: string, groupId: string) {
  const key = parsePeerGroupId(groupId);
  if (!key) throw new ProblemError("not-found", { detail: "No peer group has that name" });
  const row = await requireEdition(tx, id);
  const days = await queries.listPublicationDays(tx);
  const [kept] = await queries.listFiguresOf(tx, id, [groupId]);
  const figures: PeerGroupFigures = kept ? presentFigures(kept, days) : { status: "withheld", key, reason: "quorum" };
  const listed = (await queries.listListed(tx, id, groupId)).map((recipe) => ListedRecipe.parse(recipe));
  return { edition: presentPublished(row), figures, listed: listed.sort(byFigures) };
}

/** What the current edition releases about one metal and gas: all that a starting recipe may stand on. */
export async function readCurrentMaterial(
  tx: Db,
  material: Material,
  gas: ProcessGas,
): Promise<{ edition: PublishedEdition; groups: ReleasedGroup[]; network: NetworkFigures } | null> {
  const current = await queries.findLastPublished(tx);
  if (!current) return null;
  const read = await readMaterial(tx, current.id, material, gas);
  return { ...read, groups: read.groups.filter((group) => group.status === "released") };
}

/** What the current edition says of some groups, by their names; one it says nothing of is not there. */
export async function readCurrentGroups(
  tx: Db,
  groupIds: readonly string[],
): Promise<{ edition: PublishedEdition | null; figures: PeerGroupFigures[] }> {
  const current = await queries.findLastPublished(tx);
  if (!current) return { edition: null, figures: [] };
  const days = await queries.listPublicationDays(tx);
  const kept = await queries.listFiguresOf(tx, current.id, groupIds);
  return { edition: presentPublished(current), figures: kept.map((figures) => presentFigures(figures, days)) };
}
