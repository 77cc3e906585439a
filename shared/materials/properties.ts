import type { Material } from "./materials.ts";

/** What it takes to melt a metal from room temperature. */
export interface ThermalProperties {
  densityKgM3: number;
  /** Averaged from 25 °C to melting: for steel far above the room-temperature value, as it includes the phase changes. */
  meanSolidSpecificHeatJKgK: number;
  /** Liquidus: where the last solid is gone. */
  meltingC: number;
  heatOfFusionJKg: number;
}

/*
 * Where the values come from, said beside each:
 *   NASA    computed from the polynomials of NASA TM-4513 (McBride, Gordon, Reno 1993) for the pure element
 *   sheet   printed in data sheets of the alloy named
 *   memory  from memory, not checked against a publication
 */

const carbonSteel: ThermalProperties = {
  densityKgM3: 7870, // memory, AISI 1018
  meanSolidSpecificHeatJKgK: 697.6, // NASA, iron
  meltingC: 1460, // sheet, SAE-AISI 1021
  heatOfFusionJKg: 247_200, // NASA, iron; the sheet of 1021 prints 250,000
};

export const thermalProperties: Record<Material, ThermalProperties> = {
  "mild-steel": carbonSteel,
  // The zinc is a few hundredths of a millimetre: it matters to the lungs, not to the heat.
  "galvanised-steel": carbonSteel,
  "stainless-steel": {
    densityKgM3: 8000, // sheet, 304
    meanSolidSpecificHeatJKgK: 625, // memory, 304: 600 to 650
    meltingC: 1455, // sheet, 304
    heatOfFusionJKg: 290_000, // sheet, 316; memory for 304
  },
  aluminium: {
    densityKgM3: 2700, // sheet, 6061
    meanSolidSpecificHeatJKgK: 1058.7, // NASA
    meltingC: 652, // sheet, 6061; the pure metal 660.3
    heatOfFusionJKg: 396_600, // NASA
  },
  copper: {
    densityKgM3: 8940, // memory, C11000
    meanSolidSpecificHeatJKgK: 440.3, // NASA
    meltingC: 1084.6, // 1357.77 K, a fixed point of the ITS-90
    heatOfFusionJKg: 206_800, // NASA
  },
  brass: {
    densityKgM3: 8530, // memory, C26000
    // 70 % copper and 30 % zinc, each with its NASA mean, added by mass (Neumann and Kopp); the sheet of C26000 has only
    // the room-temperature value, 390.
    meanSolidSpecificHeatJKgK: 434,
    meltingC: 950, // sheet, C26000, two figures
    heatOfFusionJKg: 180_000, // sheet, C26000
  },
};
