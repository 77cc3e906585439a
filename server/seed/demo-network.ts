import type { applications } from "#server/db/schema/applications.ts";
import type { memberships } from "#server/db/schema/memberships.ts";
import type { shops } from "#server/db/schema/shops.ts";
import type { users } from "#server/db/schema/users.ts";
import type { Material } from "#shared/materials/materials.ts";
import { simulateMachine, type WritingHabit } from "#shared/simulation/network.ts";
import { type Random, seededRandom } from "#shared/simulation/random.ts";
import { inventPerson, inventShop, machineNames } from "./demo-names.ts";
import { inventBook, inventId, inventMachine, type NewMachine, type RecipeRows } from "./demo-recipes.ts";

export interface DemoShop {
  shop: typeof shops.$inferInsert & { id: string };
  people: { user: typeof users.$inferInsert & { id: string }; role: (typeof memberships.$inferInsert)["role"] }[];
  machines: NewMachine[];
  books: RecipeRows[];
}

/** A shop that the demo accounts of the sign-in stand-in belong to. */
export interface KnownShop {
  name: string;
  place: string;
  people: { name: string; email: string; role: "owner" | "operator" }[];
  kind: "established" | "just-joined" | "suspended";
  habit: WritingHabit;
  /** Metals it has never cut. */
  avoid?: readonly Material[];
}

/** When the invented network began, and its two editions. Fixed, so that every demo is the same. */
export const demoDays = {
  began: new Date("2025-02-01T08:00:00Z"),
  firstEdition: new Date("2026-09-01T08:00:00Z"),
  suspension: new Date("2026-10-12T08:00:00Z"),
  secondEdition: new Date("2026-11-01T08:00:00Z"),
  justJoined: new Date("2026-11-27T08:00:00Z"),
  application: new Date("2026-11-29T08:00:00Z"),
};

/** Shops before the first edition and those that came between the two. */
export interface DemoNetwork {
  before: DemoShop[];
  between: DemoShop[];
  /** Recipes that shops of the first part added between the editions. */
  added: RecipeRows[];
  application: typeof applications.$inferInsert;
}

/** An invented network of so many shops: the same for the same seed. */
export function inventNetwork(known: readonly KnownShop[], shopCount: number, seed = 47): DemoNetwork {
  const random = seededRandom(seed);
  const taken = new Set<string>();
  const network: DemoNetwork = { before: [], between: [], added: [], application: waitingApplication(random) };
  for (const shop of known) {
    const made = inventMember(random, shop, shop.kind === "just-joined" ? 0 : 2);
    network.before.push(made);
  }
  while (network.before.length + network.between.length < shopCount) {
    const { name, place, domain } = inventShop(random, taken);
    const owner = inventPerson(random);
    const people: KnownShop["people"] = [{ name: owner, email: `owner@${domain}`, role: "owner" }];
    if (random.chance(0.5)) people.push({ name: inventPerson(random), email: `table@${domain}`, role: "operator" });
    const machines = random.chance(0.4) ? 2 : 1;
    const habit = random.chance(0.4) ? "inch" : "metric";
    const made = inventMember(random, { name, place, people, kind: "established", habit }, machines);
    (random.chance(0.18) ? network.between : network.before).push(made);
  }
  splitAdded(random, network);
  return network;
}

function inventMember(random: Random, known: KnownShop, machineCount: number): DemoShop {
  const shopId = inventId(random);
  const people = known.people.map(({ role, ...person }) => ({ user: { id: inventId(random), ...person }, role }));
  const { habit } = known;
  const made: DemoShop = {
    shop: { id: shopId, name: known.name, place: known.place, joinedAt: joinDay(random, known) },
    people: people.map(({ user, role }) => ({ user: { ...user, units: habit }, role })),
    machines: [],
    books: [],
  };
  for (let i = 0; i < machineCount; i++) {
    const simulated = simulateMachine(random);
    const machine = inventMachine(random, shopId, machineNames[i] ?? `Table ${i + 1}`, simulated);
    made.machines.push(machine);
    const plan = { shopId, machine, simulated, habit, people: people.map(({ user }) => user.id) };
    const avoid = known.avoid ?? [];
    made.books.push(
      ...inventBook(random, {
        ...plan,
        recipes: random.whole(12, 22),
        from: demoDays.began,
        until: demoDays.secondEdition,
        avoid,
      }),
    );
  }
  return made;
}

function joinDay(random: Random, { kind }: KnownShop): Date {
  if (kind === "just-joined") return demoDays.justJoined;
  return new Date(demoDays.began.getTime() + random.whole(0, 300) * 24 * 3600_000);
}

/** Nine in ten recipes of older shops stood before the first edition; the rest came between the two. */
function splitAdded(random: Random, network: DemoNetwork): void {
  for (const shop of network.before) {
    const late = shop.books.filter(() => random.chance(0.12));
    network.added.push(...late);
    shop.books = shop.books.filter((book) => !late.includes(book));
  }
}

function waitingApplication(random: Random): typeof applications.$inferInsert {
  return {
    id: inventId(random),
    shopName: "Osterhollow Fabrication",
    place: "Great Osterhollow",
    contactName: "Mab Osterhollow",
    email: "owner@osterhollow.example",
    machines: 1,
    about:
      "Gates, brackets and tractor repairs. One table with a 65 A source; thin steel for the most part, some aluminium.",
    createdAt: demoDays.application,
  };
}
