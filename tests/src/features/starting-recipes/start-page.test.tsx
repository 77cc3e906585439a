import { screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import { materials } from "#shared/materials/materials.ts";
import { startingRecipe } from "#shared/recipes/starting-recipe.ts";
import { makeDistribution, makeGroup } from "#tests/support/peer-factories.ts";
import { sampleId, sampleMachine, sampleRecipe } from "#tests/support/recipe-samples.ts";
import { Refusal, renderPage, type SentRequest, testOwner } from "#tests/support/render-page.tsx";
import { StartPage } from "../../../../src/features/starting-recipes/start-page.tsx";

vi.setConfig({ testTimeout: 20_000 });

const groups = [makeGroup({ feedMmMin: makeDistribution(2080, 2310, 2490, { spread: 0.13 }) })];
const second = { ...sampleMachine, id: sampleId(12), name: "Short table", powerSourceMaxCurrentA: 35 };

/** The server's own computation on the query as sent. */
function answer({ query }: SentRequest) {
  const given = query.get("machineId") === second.id ? second : sampleMachine;
  return startingRecipe({
    material: materials.find((name) => name === query.get("material"))!,
    gas: "air",
    thicknessMm: Number(query.get("thicknessMm")),
    nozzleMm: query.has("nozzleMm") ? Number(query.get("nozzleMm")) : null,
    machine: given,
    groups: query.get("material") === "mild-steel" ? groups : [],
    network: null,
    units: "metric",
  });
}

interface Shown {
  at?: string;
  more?: Record<string, unknown>;
  session?: typeof testOwner;
}
function show({ at = "/start", more = {}, session = testOwner }: Shown = {}) {
  const rendered = renderPage({
    routes: [
      { path: "/start", Component: StartPage },
      { path: "/recipes/:id", element: "The draft" },
      { path: "*", element: "Another page" },
    ],
    at,
    session,
    answers: {
      "GET /api/machines": { items: [sampleMachine, second] },
      "GET /api/starting-recipes": answer,
      "POST /api/starting-recipes": sampleRecipe({ id: sampleId(77), state: "draft" }),
      ...more,
    },
  });
  const asked = () =>
    rendered.sent
      .filter(({ path, method }) => path === "/api/starting-recipes" && method === "GET")
      .map(({ query }) => Object.fromEntries(query));
  return { ...rendered, asked };
}

const thickness = () => screen.findByRole("textbox", { name: "Thickness" });
const metal = () => screen.getByRole("combobox", { name: "Metal" });

test("a gauge is read in the metal's own system, and read again when the metal changes", async () => {
  const { asked, router } = show();
  await userEvent.type(await thickness(), "11 ga");
  expect(await screen.findByRole("heading", { name: /^Mild steel, 3.04 mm/ })).toBeTruthy();
  await userEvent.selectOptions(metal(), "stainless-steel");
  expect(await screen.findByRole("heading", { name: /^Stainless steel, 3.18 mm/ })).toBeTruthy();
  // 11 ga of steel weighs 5 lb/ft², over 41.82 lb/ft² an inch: 3.037 mm. Of stainless, over 40: 1/8 in.
  expect(asked().map(({ thicknessMm }) => thicknessMm)).toEqual(["3.037", "3.175"]);
  expect(router.state.location.search).toBe("?thickness=3.175&metal=stainless-steel");
  expect(((await thickness()) as HTMLInputElement).value).toBe("11 ga");
});

test("typing asks once it pauses, and not at all for what cannot be read", async () => {
  const { asked } = show();
  await userEvent.type(await thickness(), "1/");
  expect(await screen.findByRole("heading", { name: "Say how thick the sheet is" })).toBeTruthy();
  await userEvent.type(await thickness(), "8 in");
  expect(await screen.findByRole("heading", { name: /^Mild steel, 3.18 mm/ })).toBeTruthy();
  expect(asked().filter(({ thicknessMm }) => thicknessMm !== "1")).toHaveLength(1);
});

test("each number has a range and says where it comes from", async () => {
  show({ at: "/start?thickness=3" });
  const rows = within(await screen.findByRole("region", { name: "Setpoints" })).getAllByRole("listitem");
  const row = (name: string) => rows.find((item) => item.textContent?.startsWith(name))!;
  expect(row("Feed rate").textContent).toMatch(/2,310 mm\/min.* to .* mm\/min.*Peers: 5 to 9 shops/);
  expect(row("Current").textContent).toMatch(/42.5 A.*40 to 45 A.*Common practice, no source/);
  expect(row("Arc voltage").textContent).toMatch(/–.*To be found by test.*height control only observing/);
  await userEvent.click(within(row("Feed rate")).getByText("How this number came about"));
  expect(within(row("Feed rate")).getByText(/^Median of 5 to 9 shops in the 3.15 mm band/)).toBeTruthy();
});

test("cautions and a numbered test plan go with the numbers", async () => {
  show({ at: "/start?metal=aluminium&thickness=3" });
  const cautions = await screen.findByRole("region", { name: "Before the arc is on" });
  expect(cautions.textContent).toContain("Hydrogen over water.");
  const plan = screen.getByRole("region", { name: "First test plan" });
  expect(within(plan).getAllByRole("listitem")).toHaveLength(9);
  expect(plan.textContent).toContain("Go on when: it pierces clean three times running");
});

test("a limit of the machine is said plainly", async () => {
  show({ at: `/start?thickness=3&nozzle=0.8&machine=${second.id}` });
  expect(await screen.findByText("Your machine sets a limit here")).toBeTruthy();
  expect(((await screen.findByRole("textbox", { name: "Nozzle orifice" })) as HTMLInputElement).value).toBe("0.8");
});

test("the nozzle is advised with its reason until one is chosen", async () => {
  const { asked } = show({ at: "/start?metal=copper&thickness=6" });
  expect(await screen.findByText(/Common practice: 0.6 mm below 1\/8 in/)).toBeTruthy();
  await userEvent.click(screen.getByRole("radio", { name: "I choose" }));
  await userEvent.type(screen.getByRole("textbox", { name: "Nozzle orifice" }), "1.1");
  expect(await screen.findByText(/You chose 1.1 mm/)).toBeTruthy();
  await userEvent.click(screen.getByRole("radio", { name: "Advise me" }));
  await waitFor(() => expect(screen.queryByText(/You chose/)).toBeNull());
  expect(asked().at(0)).not.toHaveProperty("nozzleMm");
});

test("saving sends the answers once and opens the draft", async () => {
  const { sent, router } = show({ at: "/start?thickness=3" });
  await userEvent.dblClick(await screen.findByRole("button", { name: "Save to book" }));
  expect(await screen.findByText("The draft")).toBeTruthy();
  expect(router.state.location.pathname).toBe(`/recipes/${sampleId(77)}`);
  const posts = sent.filter(({ method }) => method === "POST");
  expect(posts.map(({ body }) => body)).toEqual([
    { material: "mild-steel", gas: "air", thicknessMm: 3, machineId: sampleMachine.id },
  ]);
});

test("a refusal to save is said, and the page stays", async () => {
  show({ at: "/start?thickness=3", more: { "POST /api/starting-recipes": new Refusal("not-found") } });
  await userEvent.click(await screen.findByRole("button", { name: "Save to book" }));
  expect(await screen.findByText("There is nothing here")).toBeTruthy();
  expect(screen.getByRole("button", { name: "Save to book" })).toBeTruthy();
});

test("files hold what is on screen", async () => {
  show({ at: "/start?thickness=3&nozzle=1" });
  const query = `material=mild-steel&gas=air&thicknessMm=3&machineId=${sampleMachine.id}&nozzleMm=1`;
  const json = await screen.findByRole("link", { name: "JSON" });
  expect(json.getAttribute("href")).toBe(`/api/starting-recipes?${query}`);
  expect(screen.getByRole("link", { name: "CSV" }).getAttribute("href")).toBe(`/api/starting-recipes.csv?${query}`);
});

test("inch members type and read inches", async () => {
  show({ at: "/start?thickness=3.175", session: { ...testOwner, units: "inch" } });
  expect(((await thickness()) as HTMLInputElement).value).toBe("0.125");
  const setpoints = await screen.findByRole("region", { name: "Setpoints" });
  expect(setpoints.textContent).toMatch(/Feed rate90.9 in\/min/); // 2310 / 25.4
});

test.each([
  ["owner", true],
  ["operator", false],
] as const)("without a machine an %s learns the first step", async (role, mayAdd) => {
  const session = { ...testOwner, shop: { ...testOwner.shop!, role } };
  show({ more: { "GET /api/machines": { items: [] } }, session });
  expect(await screen.findByRole("heading", { name: "Describe your machine first" })).toBeTruthy();
  expect(screen.queryByRole("link", { name: "Add a machine" }) !== null).toBe(mayAdd);
  expect(screen.queryByText(/Ask the owner/) !== null).toBe(!mayAdd);
});
