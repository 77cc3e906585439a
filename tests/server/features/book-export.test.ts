import { afterAll, beforeAll, beforeEach, expect, test } from "vitest";
import { BookExport } from "#shared/contracts/recipes.ts";
import { createTestApi, type TestApi, type TestClient } from "../../support/api.ts";
import { makeAdmin, makeMachine, makeRecipe, makeRecipeContent, makeStaffedShop } from "../../support/factories.ts";

let api: TestApi;
let own: Awaited<ReturnType<typeof makeStaffedShop>>;
let machine: Awaited<ReturnType<typeof makeMachine>>;
let operator: TestClient;

const mark = "\uFEFF";
const header =
  "Recipe,State,Sharing,Machine,Material,Grade,Surface,Process gas,Thickness (mm),Nozzle (mm),Current (A)," +
  "Gas pressure (bar gauge),Feed rate (mm/min),Cut height (mm),Pierce height (mm),Pierce delay (s),Arc voltage (V)," +
  "Kerf width (mm),Test cuts,Acceptable test cuts,Version,Changed (UTC),Changed by,Reason,Note";

beforeAll(async () => {
  api = await createTestApi();
});
afterAll(() => api.close());

beforeEach(async () => {
  own = await makeStaffedShop(api.owner);
  machine = await makeMachine(api.owner, own.shop.id, { name: "North table" });
  operator = await api.as(own.operator.id);
});

const today = () => new Date().toISOString().slice(0, 10);

test("the book as JSON holds every recipe with every version, retired ones too, and no other shop's", async () => {
  const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, { proven: true, share: "counted" });
  await operator
    .put(`/api/recipes/${recipe.id}`)
    .send({ content: makeRecipeContent(machine.id, { grade: "S355" }), reason: "new supplier", baseVersion: 1 })
    .expect(200);
  const retired = await makeRecipe(api.owner, own.shop.id, machine.id, { thicknessMm: 12 });
  await (await api.as(own.boss.id)).post(`/api/recipes/${retired.recipe.id}/retirement`).expect(200);
  const other = await makeStaffedShop(api.owner);
  await makeRecipe(api.owner, other.shop.id, (await makeMachine(api.owner, other.shop.id)).id);

  const answer = await operator.get("/api/book.json").expect(200);
  expect(answer.headers["content-disposition"]).toBe(`attachment; filename="tempermark-book-${today()}.json"`);
  const book = BookExport.parse(answer.body);
  expect(book.recipes.map(({ id, state }) => [id, state])).toEqual([
    [recipe.id, "draft"],
    [retired.recipe.id, "retired"],
  ]);
  expect(book.recipes[0]?.versions.map((v) => [v.number, v.proven, v.reason])).toEqual([
    [2, false, "new supplier"],
    [1, true, ""],
  ]);
  expect(book.recipes[0]?.versions[0]).toEqual(book.recipes[0]?.version);
  expect(answer.body).toEqual(book);
  expect(answer.text).not.toContain(own.shop.id);
  expect(answer.text).not.toContain(own.operator.id);
});

test("the book as CSV has one row per recipe at its newest version, with units in the header and CRLF", async () => {
  const { recipe } = await makeRecipe(api.owner, own.shop.id, machine.id, {
    proven: true,
    share: "listed",
    kerfWidthMm: null,
  });
  const content = makeRecipeContent(machine.id, { grade: 'S235, "soft"', note: "naïve\nsecond line" });
  const changed = await operator
    .put(`/api/recipes/${recipe.id}`)
    .send({ content, reason: "grade", baseVersion: 1 })
    .expect(200);

  const answer = await operator.get("/api/book.csv").expect(200);
  expect(answer.headers["content-type"]).toBe("text/csv; charset=utf-8");
  expect(answer.headers["content-disposition"]).toBe(`attachment; filename="tempermark-book-${today()}.csv"`);
  const row = [
    ...[recipe.id, "draft", "listed", "North table", "Mild steel", '"S235, ""soft"""', "Clean", "Compressed air"],
    ...[3.18, 0.8, 43, 4.7, 2310, 1.5, 3.8, 0.4, 103, 1.45, 1, 1, 2],
    ...[changed.body.version.changedAt, own.operator.name, "grade", '"naïve\nsecond line"'],
  ];
  expect(answer.text).toBe(`${mark}${header}\r\n${row.join(",")}\r\n`);
});

test("a setpoint not filled in is an empty cell, and an empty book is its header", async () => {
  expect((await operator.get("/api/book.csv").expect(200)).text).toBe(`${mark}${header}\r\n`);
  expect((await operator.get("/api/book.json").expect(200)).body.recipes).toEqual([]);
  await makeRecipe(api.owner, own.shop.id, machine.id, { arcVoltageV: null, pierceDelayS: 0 });
  expect((await operator.get("/api/book.csv").expect(200)).text).toContain(",3.8,0,,1.45,0,0,1,");
});

test.each(["=1+1", "+1", "-1", "@SUM(A1)"])("text that a spreadsheet would run is defused: %s", async (grade) => {
  const content = makeRecipeContent(machine.id, { grade });
  await operator.post("/api/recipes").send({ content }).expect(201);
  expect((await operator.get("/api/book.csv").expect(200)).text).toContain(`,Mild steel,'${grade},Clean,`);
});

test.each(["\t=1", "\r=1"])("so is text that hides it behind white space: %j", async (grade) => {
  await makeRecipe(api.owner, own.shop.id, machine.id, { grade });
  expect((await operator.get("/api/book.csv").expect(200)).text).toContain(`'${grade}`);
});

test.each(["/api/book.json", "/api/book.csv"])("%s is for people of the shop only", async (path) => {
  await (await api.as()).get(path).expect(401);
  await (await api.as((await makeAdmin(api.owner)).id)).get(path).expect(403);
});
