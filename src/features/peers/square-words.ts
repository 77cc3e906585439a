import { materialLabels } from "#shared/materials/materials.ts";
import { countWords } from "#shared/peers/count-words.ts";
import { bandNominalMm } from "#shared/peers/peer-group.ts";
import { withheldWords } from "../../lib/metric-strip.tsx";
import type { MapSquare } from "./map-layout.ts";
import { nozzleWords } from "./peer-words.ts";

/** What a square shows, without its place: "20 to 49 shops", "Not enough shops yet". */
export function squareFact({ figures }: Pick<MapSquare, "figures">): string {
  return figures.status === "released" ? countWords(figures.shops) : withheldWords[figures.reason];
}

export function ownWords(own: number): string {
  return own === 1 ? "1 recipe of yours" : `${own} recipes of yours`;
}

/** A square to people who do not see the map. */
export function squareName(square: MapSquare): string {
  const { material, bandIndex, nozzleMm } = square.key;
  const place = `${materialLabels[material]}, ${bandNominalMm(bandIndex)} band, ${nozzleWords(nozzleMm)}`;
  return [place, squareFact(square), ...(square.own > 0 ? [ownWords(square.own)] : [])].join(": ");
}
