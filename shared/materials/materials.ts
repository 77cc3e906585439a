export const materials = ["mild-steel", "galvanised-steel", "stainless-steel", "aluminium", "copper", "brass"] as const;
export type Material = (typeof materials)[number];

export const materialLabels: Record<Material, string> = {
  "mild-steel": "Mild steel",
  "galvanised-steel": "Galvanised steel",
  "stainless-steel": "Stainless steel",
  aluminium: "Aluminium",
  copper: "Copper",
  brass: "Brass",
};

export const processGases = ["air", "oxygen", "nitrogen", "argon-hydrogen"] as const;
export type ProcessGas = (typeof processGases)[number];

export const processGasLabels: Record<ProcessGas, string> = {
  air: "Compressed air",
  oxygen: "Oxygen",
  nitrogen: "Nitrogen",
  "argon-hydrogen": "Argon-hydrogen",
};

export const surfaces = ["clean", "mill-scale", "rust", "paint", "corrugated", "expanded"] as const;
export type Surface = (typeof surfaces)[number];

export const surfaceLabels: Record<Surface, string> = {
  clean: "Clean",
  "mill-scale": "Mill scale",
  rust: "Rust",
  paint: "Paint",
  corrugated: "Corrugated",
  expanded: "Expanded metal",
};
