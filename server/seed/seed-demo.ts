import { demoAccounts } from "#oidc-fake/accounts.ts";
import { openDatabase } from "#server/db/client.ts";
import { runDirectBuild } from "#server/features/editions/run-build.ts";
import { seededRandom } from "#shared/simulation/random.ts";
import * as queries from "./demo.queries.ts";
import { demoDays, inventNetwork, type KnownShop } from "./demo-network.ts";
import { inventId } from "./demo-recipes.ts";

export interface SeedOptions {
  ownerUrl: string;
  editionUrl: string;
  marksKey: string;
  shops: number;
  say: (line: string) => void;
}

type Account = (typeof demoAccounts)[number];

function person(sub: Account["sub"], role: "owner" | "operator") {
  const { name, email } = demoAccounts.find((account) => account.sub === sub)!; // sub is one of theirs by type
  return { name: name.replace(" (demo)", ""), email, role };
}

const knownShops: readonly KnownShop[] = [
  {
    name: "Brackenhold Plate",
    place: "Upper Brackenhold",
    people: [person("demo-owner", "owner"), person("demo-operator", "operator")],
    kind: "established",
    habit: "metric",
    // Left for whoever looks over the demo to start on.
    avoid: ["aluminium"],
  },
  {
    name: "Fernlatch Yard",
    place: "West Fernlatch",
    people: [person("demo-new-owner", "owner")],
    kind: "just-joined",
    habit: "metric",
  },
  {
    name: "Quillmoor Cutting",
    place: "Old Quillmoor",
    people: [person("demo-suspended-owner", "owner")],
    kind: "suspended",
    habit: "inch",
  },
];

function demoAdmins() {
  const random = seededRandom(7);
  return (["demo-admin", "demo-second-admin"] as const).map((sub) => {
    const { name, email } = person(sub, "owner");
    return { id: inventId(random), name, email };
  });
}

async function buildAndPublish(options: SeedOptions, day: Date): Promise<void> {
  const result = await runDirectBuild({ url: options.editionUrl, marksKey: options.marksKey });
  if (result.outcome !== "done") throw new Error("The demo edition could not be built", { cause: result });
  const owner = openDatabase(options.ownerUrl, { max: 1 });
  try {
    await queries.publishOn(owner.db, result.editionId, day);
  } finally {
    await owner.close();
  }
}

/** Fills an empty database with the invented network: members, books, two editions. Refuses one that is in use. */
export async function seedDemo(options: SeedOptions): Promise<void> {
  const owner = openDatabase(options.ownerUrl, { max: 1, statementTimeoutMs: 600_000 });
  const { db } = owner;
  try {
    if (!(await queries.isEmptyNetwork(db)))
      throw new Error("This database is in use: demo data goes into an empty one only.");
    const network = inventNetwork(knownShops, options.shops);
    options.say(`${options.shops} shops before the first edition`);
    await db.transaction(async (tx) => {
      await queries.insertAdmins(tx, demoAdmins());
      await queries.insertShops(tx, network.before);
    });
    await queries.refreshStatistics(db);
    await buildAndPublish(options, demoDays.firstEdition);
    options.say("shops and recipes that came between the editions");
    await db.transaction(async (tx) => {
      await queries.insertShops(tx, network.between);
      await queries.insertBooks(tx, network.added);
      await queries.insertApplication(tx, network.application);
      await queries.suspendShop(tx, "Quillmoor Cutting", "Shared figures that were not its own (demo)");
    });
    await queries.refreshStatistics(db);
    await buildAndPublish(options, demoDays.secondEdition);
    options.say("the demo network is ready");
  } finally {
    await owner.close();
  }
}
