import {
  type Material,
  materialLabels,
  materials,
  type ProcessGas,
  processGasLabels,
} from "#shared/materials/materials.ts";
import { bandNominalMm, type PeerGroupKey, peerGroupId } from "#shared/peers/peer-group.ts";

export interface NamedGroup {
  id: string;
  /** Band and nozzle; metal and gas stand above. */
  name: string;
}

export interface MetalGroups {
  /** "Stainless steel, nitrogen"; compressed air goes without saying. */
  metal: string;
  groups: NamedGroup[];
}

/** Groups under their metal and gas, thin to thick, so that a long list can be read. */
export function groupsByMetal(keys: readonly PeerGroupKey[]): MetalGroups[] {
  const inOrder = [...keys].sort(
    (a, b) =>
      materials.indexOf(a.material) - materials.indexOf(b.material) ||
      a.gas.localeCompare(b.gas, "en") ||
      a.bandIndex - b.bandIndex ||
      a.nozzleMm - b.nozzleMm,
  );
  const byMetal = new Map<string, NamedGroup[]>();
  for (const key of inOrder) {
    const metal = metalName(key.material, key.gas);
    const group = { id: peerGroupId(key), name: groupName(key) };
    byMetal.set(metal, [...(byMetal.get(metal) ?? []), group]);
  }
  return [...byMetal].map(([metal, groups]) => ({ metal, groups }));
}

function metalName(material: Material, gas: ProcessGas): string {
  return gas === "air"
    ? materialLabels[material]
    : `${materialLabels[material]}, ${processGasLabels[gas].toLowerCase()}`;
}

/** "3.15 mm, nozzle 0.8 mm" with no-break spaces: one name never breaks in the middle. */
function groupName({ bandIndex, nozzleMm }: PeerGroupKey): string {
  return `${bandNominalMm(bandIndex)} mm, nozzle ${nozzleMm.toFixed(1)} mm`.replaceAll(" ", "\u00a0");
}
