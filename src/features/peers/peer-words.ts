import { type Material, materialLabels, processGasLabels } from "#shared/materials/materials.ts";
import { bandLimitsMm, bandNominalMm, type PeerGroupKey } from "#shared/peers/peer-group.ts";
import { formatNumber, formatWithUnit } from "#shared/units/format.ts";
import { gaugeRange, gaugeThicknessMm } from "#shared/units/gauges.ts";
import { mmPerInch, type UnitSystem } from "#shared/units/units.ts";

/** "Mild steel, 3.15 band, 0.8 mm nozzle". The band keeps its metric name in both systems: it is a name. */
export function groupTitle({ material, bandIndex, nozzleMm }: PeerGroupKey): string {
  return `${materialLabels[material]}, ${bandNominalMm(bandIndex)} band, ${nozzleWords(nozzleMm)}`;
}

export function nozzleWords(nozzleMm: number): string {
  return `${formatWithUnit(nozzleMm, "nozzle", "metric")} nozzle`;
}

/** "compressed air". */
export function gasWords({ gas }: Pick<PeerGroupKey, "gas">): string {
  return processGasLabels[gas].toLowerCase();
}

/** The ends of a band in the member's unit, "2.82 to 3.55 mm". */
export function bandRange(bandIndex: number, units: UnitSystem): string {
  const { from, to } = bandLimitsMm(bandIndex);
  const [factor, places, unit] = units === "inch" ? ([mmPerInch, 3, "in"] as const) : ([1, 2, "mm"] as const);
  return `${formatNumber(from / factor, places, places)} to ${formatNumber(to / factor, places, places)} ${unit}`;
}

/** Sizes sheet and plate are sold in. Common practice, no source. */
const soldMm = [1, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10, 12, 15, 20, 25, 30, 40, 50];
const soldSixteenths = [1, 2, 3, 4, 5, 6, 8, 10, 12, 16, 20, 24, 32];
/** Heavier gauges than this are asked for by fraction. */
const lightestGauge = 7;

/** The sizes that meet in a band as the trade asks for them: ["3 mm", "1/8 in", "11 ga", "10 ga"]. */
export function sizesInBand(bandIndex: number, material: Material): string[] {
  const { from, to } = bandLimitsMm(bandIndex);
  const within = (mm: number) => mm >= from && mm < to;
  const metric = soldMm.filter(within).map((mm) => `${mm} mm`);
  const inches = soldSixteenths
    .filter((sixteenths) => within((sixteenths / 16) * mmPerInch))
    .map((sixteenths) => `${fractionText(sixteenths)} in`);
  const gauges: string[] = [];
  for (let gauge = gaugeRange(material).max; gauge >= lightestGauge; gauge--) {
    const mm = gaugeThicknessMm(material, gauge);
    if (mm !== null && within(mm)) gauges.push(`${gauge} ga`);
  }
  return [...metric, ...inches, ...gauges];
}

function fractionText(sixteenths: number): string {
  let [above, below] = [sixteenths, 16];
  while (above % 2 === 0 && below > 1) [above, below] = [above / 2, below / 2];
  const whole = Math.floor(above / below);
  const rest = above % below;
  return [whole > 0 ? String(whole) : "", rest > 0 ? `${rest}/${below}` : ""].filter(Boolean).join(" ");
}

/** "2.82 to 3.55 mm, so 3 mm, 1/8 in and 11 ga together". */
export function bandWords({ bandIndex, material }: PeerGroupKey, units: UnitSystem): string {
  const range = bandRange(bandIndex, units);
  const sizes = sizesInBand(bandIndex, material);
  return sizes.length > 1 ? `${range}, so ${listWords(sizes)} together` : range;
}

/** "a, b and c". */
export function listWords(words: readonly string[]): string {
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;
}

/** Share of test cuts found acceptable; its ends stand for everything beyond them. */
export function acceptableWords(share: number | null): string {
  if (share === null) return "Too few shops here have recorded test cuts to say how many were acceptable.";
  const percent = Math.round(share * 100);
  const amount = share <= 0.05 ? "5 % or fewer" : share >= 0.95 ? "95 % or more" : `About ${percent} %`;
  return `${amount} of the test cuts recorded here were acceptable, each shop counting alike.`;
}
