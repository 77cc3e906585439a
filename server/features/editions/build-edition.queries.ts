import { and, eq, notInArray, or, sql } from "drizzle-orm";
import type { Db } from "#server/db/client.ts";
import { editionGroups, listedRecipes } from "#server/db/schema/edition-groups.ts";
import { editionMemories } from "#server/db/schema/edition-memories.ts";
import { editions } from "#server/db/schema/editions.ts";
import type { EditionChanges } from "#shared/contracts/editions.ts";
import type { ListedRecipe, NetworkFigures, PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import type { GroupMemory } from "#shared/disclosure/ledger.ts";
import { type PeerGroupKey, peerGroupId } from "#shared/peers/peer-group.ts";
import type { SharedRecipe } from "./build-group.ts";

export type EditionRow = typeof editions.$inferSelect;

/** Rows of the cursor held in memory at once. */
const fetchSize = 2000;

export async function findLastPublished(tx: Db): Promise<EditionRow | undefined> {
  const [row] = await tx
    .select()
    .from(editions)
    .where(eq(editions.state, "published"))
    .orderBy(sql`${editions.number} desc`)
    .limit(1);
  return row;
}

export async function nextEditionNumber(tx: Db): Promise<number> {
  const [row] = await tx.select({ next: sql<number>`coalesce(max(${editions.number}), 0) + 1` }).from(editions);
  return row!.next; // an aggregate gives one row
}

export async function insertEdition(tx: Db, values: typeof editions.$inferInsert): Promise<void> {
  await tx.insert(editions).values(values);
}

export async function completeEdition(
  tx: Db,
  id: string,
  values: { digest: string; networkFigures: NetworkFigures; changes: EditionChanges; releasedGroups: number },
): Promise<void> {
  await tx.update(editions).set(values).where(eq(editions.id, id));
}

/** Groups somebody contributes to now, and those remembered from the last published edition; in the cursor's order. */
export async function listGroups(tx: Db, lastPublished: string | null): Promise<PeerGroupKey[]> {
  const { rows } = await tx.execute<PeerGroupKey & Record<string, unknown>>(sql`
    select material, gas, band_index as "bandIndex", nozzle_mm as "nozzleMm" from counted_contributions
    union
    select material, process_gas, band_index, nozzle_mm from edition_memories where edition_id = ${lastPublished}
    order by 1, 2, 3, 4`);
  return rows;
}

type CursorRow = Record<string, unknown> & {
  key: PeerGroupKey;
  traits: SharedRecipe["traits"];
  setpoints: SharedRecipe["setpoints"];
} & Omit<SharedRecipe, "key" | "traits" | "setpoints">;

/** Every contribution, one group after the other, in the order of `listGroups`; a group at a time in memory. */
export async function* readContributions(tx: Db): AsyncGenerator<{ groupId: string; recipes: SharedRecipe[] }> {
  await tx.execute(sql`
    declare contributions no scroll cursor for
    select shop::double precision as shop, machine::double precision as machine,
      json_build_object('material', material, 'gas', gas, 'bandIndex', band_index, 'nozzleMm', nozzle_mm) as key,
      thickness_mm as "thicknessMm", test_cuts as "testCuts", accepted_cuts as "acceptedCuts",
      json_build_object('currentA', current_a, 'pressureBar', pressure_bar, 'feedMmMin', feed_mm_min,
        'cutHeightMm', cut_height_mm, 'pierceHeightMm', pierce_height_mm, 'pierceDelayS', pierce_delay_s,
        'arcVoltageV', arc_voltage_v, 'kerfWidthMm', kerf_width_mm) as setpoints,
      share_level = 'listed' as listed, public_text as "publicText",
      to_char(proven_at at time zone 'UTC', 'YYYY-MM-DD') as "provenOn",
      json_build_object('startMethod', start_method, 'dryness', dryness, 'heightControl', height_control) as traits
    from counted_contributions
    order by material, gas, band_index, nozzle_mm, shop, machine`);
  let group: { groupId: string; recipes: SharedRecipe[] } | undefined;
  for (;;) {
    const { rows } = await tx.execute<CursorRow>(sql.raw(`fetch forward ${fetchSize} from contributions`));
    if (rows.length === 0) break;
    for (const row of rows) {
      const groupId = peerGroupId(row.key);
      if (group && group.groupId !== groupId) {
        yield group;
        group = undefined;
      }
      group ??= { groupId, recipes: [] };
      group.recipes.push(row);
    }
  }
  if (group) yield group;
}

/** What the last published edition says and remembers of one group. */
export async function findGroupBefore(
  tx: Db,
  editionId: string,
  groupId: string,
): Promise<{ memory: GroupMemory; status: string | null } | undefined> {
  const [row] = await tx
    .select({ memory: editionMemories.memory, status: sql<string | null>`${editionGroups.figures} ->> 'status'` })
    .from(editionMemories)
    .leftJoin(
      editionGroups,
      and(eq(editionGroups.editionId, editionMemories.editionId), eq(editionGroups.groupId, editionMemories.groupId)),
    )
    .where(and(eq(editionMemories.editionId, editionId), eq(editionMemories.groupId, groupId)));
  return row;
}

function keyColumns({ material, gas, bandIndex, nozzleMm }: PeerGroupKey) {
  return { material, processGas: gas, bandIndex, nozzleMm };
}

export async function insertGroup(tx: Db, editionId: string, figures: PeerGroupFigures): Promise<void> {
  const groupId = peerGroupId(figures.key);
  await tx.insert(editionGroups).values({ editionId, groupId, ...keyColumns(figures.key), figures });
}

export async function insertListed(tx: Db, editionId: string, groupId: string, listed: ListedRecipe[]): Promise<void> {
  await tx.insert(listedRecipes).values(listed.map((recipe) => ({ id: recipe.id, editionId, groupId, recipe })));
}

export async function insertMemory(tx: Db, editionId: string, key: PeerGroupKey, memory: GroupMemory): Promise<void> {
  await tx.insert(editionMemories).values({ editionId, groupId: peerGroupId(key), ...keyColumns(key), memory });
}

/** Memories no later build will ask for. */
export async function dropOldMemories(tx: Db, lastPublished: string | null): Promise<void> {
  const undecided = tx
    .select({ id: editions.id })
    .from(editions)
    .where(or(eq(editions.state, "built"), eq(editions.id, lastPublished ?? sql`null`)));
  await tx.delete(editionMemories).where(notInArray(editionMemories.editionId, undecided));
}

/** What discarded editions would have said. Their rows stay, so that a number is never given twice. */
export async function emptyDiscarded(tx: Db): Promise<void> {
  const discarded = sql`edition_id in (select id from editions where state = 'discarded')`;
  await tx.delete(listedRecipes).where(discarded);
  await tx.delete(editionGroups).where(discarded);
}
