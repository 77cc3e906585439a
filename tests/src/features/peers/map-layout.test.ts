import { expect, test } from "vitest";
import { type PeerGroupKey, peerGroupOf } from "#shared/peers/peer-group.ts";
import { makeGroup } from "#tests/support/peer-factories.ts";
import { mapLayout, neighbour } from "../../../../src/features/peers/map-layout.ts";

const at = (thicknessMm: number, nozzleMm: number): PeerGroupKey =>
  peerGroupOf({ material: "mild-steel", thicknessMm, nozzleMm, gas: "air" });
const empty = { material: "mild-steel", gas: "air", groups: [], own: [] } as const;

test("a metal without figures still has the usual bands and nozzles, every square withheld", () => {
  const { bands, nozzles, rows } = mapLayout(empty);
  expect(bands).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
  expect(nozzles).toEqual([0.6, 0.8, 1]);
  const statuses = rows.flat().map(({ figures }) => (figures.status === "withheld" ? figures.reason : "released"));
  expect(statuses).toEqual(Array(33).fill("quorum"));
});

test("groups and own recipes widen the map without a gap", () => {
  const groups = [makeGroup({}, { key: at(20, 1.2) })];
  const { bands, nozzles, rows } = mapLayout({ ...empty, groups, own: [at(0.5, 0.6), at(3, 0.8), at(3.175, 0.8)] });
  expect([bands[0], bands.at(-1), bands.length]).toEqual([-3, 13, 17]);
  expect(nozzles).toEqual([0.6, 0.8, 1, 1.2]);
  const squares = rows.flat();
  expect(squares.find(({ groupId }) => groupId === "mild-steel_t20_n1.2_air")?.figures.status).toBe("released");
  expect(squares.filter(({ own }) => own > 0).map(({ groupId, own }) => [groupId, own])).toEqual([
    ["mild-steel_t0.5_n0.6_air", 1],
    ["mild-steel_t3.15_n0.8_air", 2],
  ]);
});

test.each([
  ["ArrowRight", { row: 0, column: 1 }],
  ["ArrowDown", { row: 1, column: 0 }],
  ["End", { row: 0, column: 2 }],
  ["ArrowLeft", undefined],
  ["ArrowUp", undefined],
  ["Enter", undefined],
])("%s leads from the first square to %j", (key, to) => {
  expect(neighbour(mapLayout(empty), { row: 0, column: 0 }, key)).toEqual(to);
});

test("no key leads out of the last corner", () => {
  const corner = { row: 10, column: 2 };
  expect(["ArrowRight", "ArrowDown"].map((key) => neighbour(mapLayout(empty), corner, key))).toEqual([
    undefined,
    undefined,
  ]);
});
