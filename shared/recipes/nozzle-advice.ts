import { type CountBand, countBands, type ReleasedGroup } from "../contracts/released-figures.ts";
import type { NozzleAdvice } from "../contracts/starting-recipe-figures.ts";
import { countWords } from "../peers/count-words.ts";
import { bandIndexOf, bandLabel, nozzleStep } from "../peers/peer-group.ts";
import { lowestCurrentA, practiceNozzleMm } from "./practice.ts";
import type { StartingRecipeInput } from "./starting-input.ts";

type NozzleQuestion = Pick<StartingRecipeInput, "material" | "thicknessMm" | "gas" | "nozzleMm" | "machine" | "groups">;

/**
 * The nozzle to start with: the shop's own choice; else the one with most peers on this band; else common practice, down
 * to what the power source can feed.
 */
export function adviseNozzle(question: NozzleQuestion): NozzleAdvice {
  return chosen(question) ?? byPeers(question) ?? byPractice(question);
}

function chosen({ nozzleMm, thicknessMm, gas }: NozzleQuestion): NozzleAdvice | null {
  if (nozzleMm === null) return null;
  const nozzle = nozzleStep(nozzleMm);
  const usual = practiceNozzleMm(thicknessMm);
  const otherwise =
    gas !== "air" || usual === nozzle ? "" : ` Common practice would take ${usual.toFixed(1)} mm for this thickness.`;
  return { nozzleMm: nozzle, chosenBy: "shop", reason: `You chose ${nozzle.toFixed(1)} mm.${otherwise}` };
}

/** Groups of this band and gas whose median current the power source can give, most shops first. */
function byPeers({ material, thicknessMm, gas, machine, groups }: NozzleQuestion): NozzleAdvice | null {
  const band = bandIndexOf(thicknessMm);
  const usual = practiceNozzleMm(thicknessMm);
  const [best] = groups
    .filter(({ key }) => key.material === material && key.bandIndex === band && key.gas === gas)
    .filter((group) => isFed(group, machine.powerSourceMaxCurrentA))
    .sort(
      (a, b) => rank(b.shops) - rank(a.shops) || Math.abs(a.key.nozzleMm - usual) - Math.abs(b.key.nozzleMm - usual),
    );
  if (!best) return null;
  const nozzle = best.key.nozzleMm;
  const reason = `${nozzle.toFixed(1)} mm has the most peers in the ${bandLabel(band)} that your power source can follow: ${countWords(best.shops)}.`;
  return { nozzleMm: nozzle, chosenBy: "peers", reason };
}

function isFed(group: ReleasedGroup, maxCurrentA: number): boolean {
  return (group.distributions.currentA?.quantiles.p50 ?? 0) <= maxCurrentA;
}

function rank(shops: CountBand): number {
  return countBands.indexOf(shops);
}

function byPractice({ thicknessMm, gas, machine }: NozzleQuestion): NozzleAdvice {
  if (gas !== "air") {
    const reason =
      "No peers cut this with that gas, and common practice here is for air: take the nozzle from the torch maker's manual.";
    return { nozzleMm: null, chosenBy: "nobody", reason };
  }
  const usual = practiceNozzleMm(thicknessMm);
  const rule = "Common practice: 0.6 mm below 1/8 in, 0.8 mm up to 1/4 in, 1.0 mm above.";
  const fed = [1, 0.8, 0.6].find(
    (nozzle) => nozzle <= usual && lowestCurrentA(nozzle) <= machine.powerSourceMaxCurrentA,
  );
  if (fed === undefined || fed === usual) return { nozzleMm: usual, chosenBy: "practice", reason: rule };
  const why = `${usual.toFixed(1)} mm needs ${lowestCurrentA(usual)} A or more and your power source gives ${machine.powerSourceMaxCurrentA} A, so one that it can feed.`;
  return { nozzleMm: fed, chosenBy: "practice", reason: `${rule} ${why}` };
}
