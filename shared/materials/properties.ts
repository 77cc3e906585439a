import type { Material } from "./materials.ts";

/** What it takes to melt a metal from room temperature. */
export interface ThermalProperties {
  densityKgM3: number;
  /** Averaged from 20 °C to melting: well above the room-temperature value of steels, whose phase changes it includes. */
  meanSolidSpecificHeatJKgK: number;
  /** Liquidus: where the last solid is gone. */
  meltingC: number;
  heatOfFusionJKg: number;
}

/**
 * Carbon steel. Density 7870 from memory (AISI 1018); liquidus 1460 and heat of fusion 250 kJ/kg as data sheets print them
 * for SAE-AISI 1021; mean specific heat 698 computed for iron from the NASA polynomials (TM-4513).
 */
const carbonSteel: ThermalProperties = {
  densityKgM3: 7870,
  meanSolidSpecificHeatJKgK: 698,
  meltingC: 1460,
  heatOfFusionJKg: 250_000,
};

export const thermalProperties: Record<Material, ThermalProperties> = {
  "mild-steel": carbonSteel,
  // The zinc is a few hundredths of a millimetre: it matters to the lungs, not to the heat.
  "galvanised-steel": carbonSteel,
  // 304: density and liquidus from data sheets; heat of fusion 290 kJ/kg seen for 316; mean specific heat from memory, unverified.
  "stainless-steel": { densityKgM3: 8000, meanSolidSpecificHeatJKgK: 625, meltingC: 1455, heatOfFusionJKg: 290_000 },
  // 6061: density and liquidus from data sheets; mean specific heat and heat of fusion of pure aluminium, NASA polynomials.
  aluminium: { densityKgM3: 2700, meanSolidSpecificHeatJKgK: 1059, meltingC: 652, heatOfFusionJKg: 397_000 },
  // Density from memory (C11000); the rest computed from the NASA polynomials.
  copper: { densityKgM3: 8940, meanSolidSpecificHeatJKgK: 440, meltingC: 1084.6, heatOfFusionJKg: 206_800 },
  // C26000: density from memory, liquidus, room-temperature specific heat and heat of fusion from data sheets.
  brass: { densityKgM3: 8530, meanSolidSpecificHeatJKgK: 390, meltingC: 950, heatOfFusionJKg: 180_000 },
};
