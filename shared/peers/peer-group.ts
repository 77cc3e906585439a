import { z } from "zod";
import { type Material, materials, type ProcessGas, processGases } from "../materials/materials.ts";

/** What makes recipes comparable: same material, thickness band, nozzle and process gas. */
export const PeerGroupKey = z.object({
  material: z.enum(materials),
  bandIndex: z.number().int().describe("Thickness band: round(10·log10(thickness/mm)), the R10 series of ISO 3"),
  nozzleMm: z.number().positive().describe("Nominal nozzle orifice to 0.1 mm"),
  gas: z.enum(processGases),
});
export type PeerGroupKey = z.infer<typeof PeerGroupKey>;

/** What of a recipe decides its peer group. */
export interface PeerGroupSubject {
  material: Material;
  thicknessMm: number;
  nozzleMm: number;
  gas: ProcessGas;
}

/** One decade of the R10 series of preferred numbers as ISO 3 rounds it. */
const r10 = [1, 1.25, 1.6, 2, 2.5, 3.15, 4, 5, 6.3, 8] as const;

/** Band of the R10 series nearest on a log scale. 3 mm, 11 ga and 1/8 in meet in one band. */
export function bandIndexOf(thicknessMm: number): number {
  if (!(thicknessMm > 0) || !Number.isFinite(thicknessMm)) {
    throw new RangeError("bandIndexOf needs a thickness above 0 mm");
  }
  return Math.round(10 * Math.log10(thicknessMm)) + 0; // + 0 turns a -0 just under 1 mm into 0
}

/** The preferred number a band is named after, mm. */
export function bandNominalMm(bandIndex: number): number {
  if (!Number.isInteger(bandIndex)) throw new RangeError("bandNominalMm needs a whole band index");
  const decade = Math.floor(bandIndex / 10);
  const step = r10[bandIndex - 10 * decade]!; // the remainder of a whole number is 0 to 9
  return Number((step * 10 ** decade).toPrecision(3));
}

/** Geometric bounds of a band, mm: `from` belongs to it, `to` to the next. */
export function bandLimitsMm(bandIndex: number): { from: number; to: number } {
  return { from: 10 ** ((bandIndex - 0.5) / 10), to: 10 ** ((bandIndex + 0.5) / 10) };
}

/** A band in words, such as "3.15 mm band". */
export function bandLabel(bandIndex: number): string {
  return `${bandNominalMm(bandIndex)} mm band`;
}

/** Nominal orifice to 0.1 mm: what makers print differs by less than they machine. */
export function nozzleStep(nozzleMm: number): number {
  // 2.55 * 10 is a hair under 25.5 in binary; PostgreSQL, which groups contributions, rounds the decimal that was typed.
  return Math.round(Number((nozzleMm * 10).toPrecision(12))) / 10;
}

export function peerGroupOf(subject: PeerGroupSubject): PeerGroupKey {
  return {
    material: subject.material,
    bandIndex: bandIndexOf(subject.thicknessMm),
    nozzleMm: nozzleStep(subject.nozzleMm),
    gas: subject.gas,
  };
}

/** Stable, URL-safe name of a group, such as `mild-steel_t3.15_n0.8_air`. */
export function peerGroupId(key: PeerGroupKey): string {
  return `${key.material}_t${bandNominalMm(key.bandIndex)}_n${nozzleStep(key.nozzleMm)}_${key.gas}`;
}

const idShape = /^([a-z-]+)_t(\d+(?:\.\d+)?)_n(\d+(?:\.\d)?)_([a-z-]+)$/;

/** The key behind an id; null for anything `peerGroupId` would not have written. */
export function parsePeerGroupId(id: string): PeerGroupKey | null {
  const [, material, nominal, nozzle, gas] = idShape.exec(id) ?? [];
  if (!(Number(nominal) > 0)) return null;
  const parsed = PeerGroupKey.safeParse({
    material,
    bandIndex: bandIndexOf(Number(nominal)),
    nozzleMm: Number(nozzle),
    gas,
  });
  return parsed.success && peerGroupId(parsed.data) === id ? parsed.data : null;
}
