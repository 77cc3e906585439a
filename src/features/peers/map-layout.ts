import type { PeerGroupFigures } from "#shared/contracts/released-figures.ts";
import type { Material, ProcessGas } from "#shared/materials/materials.ts";
import { type PeerGroupKey, peerGroupId } from "#shared/peers/peer-group.ts";

export interface MapSquare {
  key: PeerGroupKey;
  groupId: string;
  /** As the edition says; a group it does not name has too few shops. */
  figures: PeerGroupFigures;
  /** Own recipes here. */
  own: number;
}

/** Thickness bands down, thinnest first; nozzles across. */
export interface MapLayout {
  bands: number[];
  nozzles: number[];
  /** One row a band, one square a nozzle. */
  rows: MapSquare[][];
}

/** 1 to 10 mm, and the three nozzles in common use: the map keeps its shape from metal to metal. */
const usualBands = { from: 0, to: 10 };
const usualNozzles = [0.6, 0.8, 1];

export interface MapContent {
  material: Material;
  gas: ProcessGas;
  groups: readonly PeerGroupFigures[];
  /** Groups of the own recipes, one entry a recipe. */
  own: readonly PeerGroupKey[];
}

export function mapLayout({ material, gas, groups, own }: MapContent): MapLayout {
  const keys = [...groups.map(({ key }) => key), ...own];
  const indices = keys.map(({ bandIndex }) => bandIndex);
  const first = Math.min(usualBands.from, ...indices);
  const last = Math.max(usualBands.to, ...indices);
  const bands = Array.from({ length: last - first + 1 }, (_, i) => first + i);
  const nozzles = [...new Set([...usualNozzles, ...keys.map(({ nozzleMm }) => nozzleMm)])].sort((a, b) => a - b);

  const shown = new Map(groups.map((group) => [peerGroupId(group.key), group]));
  const ownIds = own.map(peerGroupId);
  const square = (bandIndex: number, nozzleMm: number): MapSquare => {
    const key = { material, bandIndex, nozzleMm, gas };
    const groupId = peerGroupId(key);
    const figures = shown.get(groupId) ?? { status: "withheld" as const, key, reason: "quorum" as const };
    return { key, groupId, figures, own: ownIds.filter((id) => id === groupId).length };
  };
  return { bands, nozzles, rows: bands.map((band) => nozzles.map((nozzle) => square(band, nozzle))) };
}

/** The square a key of the keyboard leads to from this one; undefined for every other key and at the rim. */
export function neighbour(
  { rows }: MapLayout,
  at: { row: number; column: number },
  key: string,
): { row: number; column: number } | undefined {
  const across = rows[0]?.length ?? 0;
  const moves: Record<string, { row: number; column: number }> = {
    ArrowUp: { row: at.row - 1, column: at.column },
    ArrowDown: { row: at.row + 1, column: at.column },
    ArrowLeft: { row: at.row, column: at.column - 1 },
    ArrowRight: { row: at.row, column: at.column + 1 },
    Home: { row: at.row, column: 0 },
    End: { row: at.row, column: across - 1 },
  };
  const to = moves[key];
  return to && rows[to.row]?.[to.column] ? to : undefined;
}
