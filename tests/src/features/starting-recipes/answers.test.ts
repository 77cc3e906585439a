import { expect, test } from "vitest";
import { sampleId, sampleMachine } from "#tests/support/recipe-samples.ts";
import { noAnswers, queryOf, readAnswers } from "../../../../src/features/starting-recipes/answers.ts";

const second = { ...sampleMachine, id: sampleId(12) };
const machines = [sampleMachine, second] as const;
const read = (url: Partial<typeof noAnswers>) => readAnswers({ ...noAnswers, ...url }, [...machines]);

test("nothing answered: mild steel, air, the first machine, nothing asked", () => {
  expect(read({})).toMatchObject({ material: "mild-steel", gas: "air", machine: sampleMachine });
  expect(queryOf(read({}))).toBeNull();
});

test("what a URL cannot truly say counts as not answered", () => {
  const answers = read({ metal: "lead", gas: "steam", thickness: "51", nozzle: "-1", machine: sampleId(99) });
  expect(answers).toEqual({
    material: "mild-steel",
    gas: "air",
    thicknessMm: undefined,
    nozzleMm: undefined,
    machine: sampleMachine,
  });
});

test("an answered URL asks for exactly that", () => {
  const answers = read({ metal: "brass", gas: "nitrogen", thickness: "3.175", nozzle: "1.1", machine: second.id });
  expect(queryOf(answers)).toEqual({
    material: "brass",
    gas: "nitrogen",
    thicknessMm: 3.175,
    nozzleMm: 1.1,
    machineId: second.id,
  });
});
