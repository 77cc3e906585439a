import type { Caution } from "../contracts/starting-recipe-figures.ts";
import type { Material, ProcessGas } from "../materials/materials.ts";
import { minimumShade } from "./eye-protection.ts";

export interface CautionSubject {
  material: Material;
  gas: ProcessGas;
  /** The most the arc may carry, A; null where no current is known. */
  currentA: number | null;
}

/**
 * The cautions that go with numbers to cut with: on screen, on paper, in every export. Those for the metal and gas at hand
 * come before the ones that always hold. Standards by number only.
 */
export function cautionsFor({ material, gas, currentA }: CautionSubject): Caution[] {
  return [eyes(currentA), fumes(material), ...forMaterial[material], ...forGas[gas], ...always];
}

function eyes(currentA: number | null): Caution {
  const shade =
    currentA === null
      ? "at least shade 8 under 300 A, 9 from 300 A, 10 from 400 A"
      : `at least shade ${minimumShade(currentA)} for up to ${currentA} A`;
  return {
    id: "eyes-and-skin",
    title: "Eyes and skin",
    text: `Wear a filter of ${shade} where the arc is in sight. Cover all skin; screen the arc from others. Wear hearing protection.`,
    standards: ["29 CFR 1910.133", "ANSI Z49.1"],
  };
}

const metalFume: Record<Material, string> = {
  "mild-steel": "The fume holds iron and manganese; paint and oil add more, so strip them first.",
  "galvanised-steel": "The fume holds zinc and causes metal fume fever. Strip the coating where you can.",
  "stainless-steel":
    "The fume holds chromium VI and nickel, which cause cancer. Extract at the source and have the exposure measured.",
  aluminium: "The fume is fine oxide, and with air as the gas the arc makes much ozone.",
  copper: "Copper fume causes metal fume fever.",
  brass: "The fume holds zinc and may hold lead. Know the alloy before you cut it.",
};

function fumes(material: Material): Caution {
  return {
    id: "fumes",
    title: "Fumes",
    text: `Cut only with fume extraction running. ${metalFume[material]} Keep chlorinated solvents away: the arc turns their vapour into poison.`,
    standards: ["29 CFR 1910.252", ...(material === "stainless-steel" ? ["29 CFR 1910.1026"] : [])],
  };
}

const forMaterial: Record<Material, Caution[]> = {
  "mild-steel": [],
  "galvanised-steel": [],
  "stainless-steel": [],
  aluminium: [
    {
      id: "hydrogen",
      title: "Hydrogen over water",
      text: "Hot aluminium makes hydrogen in a water table; it gathers under the plate and explodes. Air the water before and during cutting, clear the dross often, leave no plate lying on it.",
      standards: [],
    },
    {
      id: "metal-dust",
      title: "Aluminium dust",
      text: "Dry aluminium dust explodes, the more so mixed with steel dust or rust. Keep it out of a filter that also takes steel.",
      standards: [],
    },
  ],
  copper: [],
  brass: [],
};

const forGas: Record<ProcessGas, Caution[]> = {
  air: [],
  oxygen: [
    {
      id: "oxygen",
      title: "Oxygen",
      text: "Oil and grease take fire in oxygen by themselves. Use parts made for oxygen only; do not let it gather.",
      standards: ["ANSI Z49.1"],
    },
  ],
  nitrogen: [
    {
      id: "nitrogen",
      title: "Nitrogen",
      text: "Nitrogen displaces the air you breathe without a warning. Ventilate; nobody alone in a small or low room.",
      standards: ["ANSI Z49.1"],
    },
  ],
  "argon-hydrogen": [
    {
      id: "argon-hydrogen",
      title: "Argon-hydrogen",
      text: "The mixture burns, and its hydrogen gathers under hoods and plates. Check for leaks, ventilate, use only a torch made for it.",
      standards: ["ANSI Z49.1"],
    },
  ],
};

const always: Caution[] = [
  {
    id: "voltage",
    title: "Voltage",
    text: "Mains and arc voltage kill. Switch off and lock out before touching torch, cable or consumables. Leave electrical work on the height control and its divider to qualified people.",
    standards: ["ANSI Z49.1"],
  },
  {
    id: "fire",
    title: "Fire",
    text: "Clear what burns, never cut a closed vessel, keep an extinguisher at hand and a fire watch afterwards.",
    standards: ["NFPA 51B", "29 CFR 1910.252"],
  },
  {
    id: "pressure",
    title: "Compressed gas",
    text: "Let the pressure off before opening a line. Secure cylinders. Stay under the rated pressure of torch and regulator.",
    standards: ["ANSI Z49.1"],
  },
  {
    id: "reports",
    title: "What these numbers are",
    text: "They report what other shops do and are no instruction. Read the power source maker's manual and follow local codes: both come first.",
    standards: ["AWS C5.2", "ANSI Z49.1"],
  },
];
