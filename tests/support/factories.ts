import { randomUUID } from "node:crypto";
import type { Database } from "#server/db/client.ts";
import { machines } from "#server/db/schema/machines.ts";
import { memberships } from "#server/db/schema/memberships.ts";
import { recipeVersions } from "#server/db/schema/recipe-versions.ts";
import { recipes } from "#server/db/schema/recipes.ts";
import { shares } from "#server/db/schema/shares.ts";
import { shops } from "#server/db/schema/shops.ts";
import { testCuts } from "#server/db/schema/test-cuts.ts";
import { networkAdmins, users } from "#server/db/schema/users.ts";
import type { RecipeContent } from "#shared/contracts/recipes.ts";
import type { TestCutInput } from "#shared/contracts/test-cuts.ts";

type Owner = Pick<Database, "db">;

async function one<Row>(rows: Promise<Row[]>): Promise<Row> {
  return (await rows)[0]!; // every insert here returns its one row
}

export function makeUser({ db }: Owner, values: Partial<typeof users.$inferInsert> = {}) {
  const tag = randomUUID().slice(0, 8);
  const row = { email: `${tag}@person.example`, name: `Person ${tag}`, provider: "test", subject: tag, ...values };
  return one(db.insert(users).values(row).returning());
}

export function makeShop({ db }: Owner, values: Partial<typeof shops.$inferInsert> = {}) {
  const row = { name: `Shop ${randomUUID().slice(0, 8)}`, place: "Testham", ...values };
  return one(db.insert(shops).values(row).returning());
}

/** A shop with an owner and an operator. */
export async function makeStaffedShop(owner: Owner, values: Partial<typeof shops.$inferInsert> = {}) {
  const shop = await makeShop(owner, values);
  const [boss, operator] = [await makeUser(owner), await makeUser(owner)];
  await owner.db.insert(memberships).values([
    { userId: boss.id, shopId: shop.id, role: "owner" },
    { userId: operator.id, shopId: shop.id, role: "operator" },
  ]);
  return { shop, boss, operator };
}

export async function makeAdmin(owner: Owner) {
  const user = await makeUser(owner);
  await owner.db.insert(networkAdmins).values({ userId: user.id });
  return user;
}

export function makeMachine({ db }: Owner, shopId: string, values: Partial<typeof machines.$inferInsert> = {}) {
  const row = {
    shopId,
    name: `Table ${randomUUID().slice(0, 8)}`,
    powerSourceMaxCurrentA: 65,
    startMethod: "contact" as const,
    torchPressureBar: 5,
    dryness: "refrigerated" as const,
    heightControl: "arc-voltage" as const,
    heightControlSampleHz: 100,
    topFeedMmMin: 10_000,
    ...values,
  };
  return one(db.insert(machines).values(row).returning());
}

/** Setpoints that belong together on 3.18 mm mild steel with a 0.8 mm nozzle. */
export const plainSetpoints = {
  currentA: 43,
  pressureBar: 4.7,
  feedMmMin: 2310,
  cutHeightMm: 1.5,
  pierceHeightMm: 3.8,
  pierceDelayS: 0.4,
  arcVoltageV: 103,
  kerfWidthMm: 1.45,
};

/** A recipe with one version; `proven` gives it an acceptable test cut too. */
export async function makeRecipe(
  { db }: Owner,
  shopId: string,
  machineId: string,
  {
    proven = false,
    share,
    ...values
  }: Partial<typeof recipeVersions.$inferInsert> & { proven?: boolean; share?: "counted" | "listed" } = {},
) {
  const recipe = await one(
    db
      .insert(recipes)
      .values({ shopId, currentVersion: 1, state: proven ? "proven" : "draft" })
      .returning(),
  );
  const row = {
    recipeId: recipe.id,
    shopId,
    machineId,
    number: 1,
    material: "mild-steel" as const,
    surface: "clean" as const,
    processGas: "air" as const,
    thicknessMm: 3.18,
    nozzleMm: 0.8,
    ...plainSetpoints,
    origin: { kind: "typed" as const, editionNumber: null, basis: {} },
    provenAt: proven ? new Date("2026-08-01T10:00:00Z") : null,
    ...values,
  };
  const version = await one(db.insert(recipeVersions).values(row).returning());
  if (proven) await makeTestCut({ db }, version);
  if (share) await db.insert(shares).values({ recipeId: recipe.id, shopId, level: share });
  return { recipe, version };
}

export function makeTestCut(
  { db }: Owner,
  version: { recipeId: string; shopId: string; number: number },
  values: Partial<typeof testCuts.$inferInsert> = {},
) {
  const row = {
    shopId: version.shopId,
    recipeId: version.recipeId,
    versionNumber: version.number,
    cutAt: new Date("2026-08-01T10:00:00Z"),
    cutThrough: true,
    dross: "none" as const,
    topEdge: "square" as const,
    acceptable: true,
    ...values,
  };
  return one(db.insert(testCuts).values(row).returning());
}

/** What a member types for a recipe, as the API takes it: plain setpoints on 3.18 mm mild steel. */
export function makeRecipeContent(machineId: string, values: Partial<RecipeContent> = {}): RecipeContent {
  return {
    machineId,
    material: "mild-steel",
    grade: "",
    surface: "clean",
    processGas: "air",
    thicknessMm: 3.18,
    nozzleMm: 0.8,
    setpoints: plainSetpoints,
    note: "",
    ...values,
  };
}

/** A clean cut as the API takes it, through and acceptable. */
export function makeTestCutInput(values: Partial<TestCutInput> = {}): TestCutInput {
  return {
    versionNumber: 1,
    cutAt: "2026-08-01T10:00:00Z",
    cutThrough: true,
    dross: "none",
    topEdge: "square",
    bevelDeg: null,
    kerfWidthMm: null,
    uMm: null,
    rz5Um: null,
    acceptable: true,
    note: "",
    ...values,
  };
}
