import type { CountBand } from "#shared/contracts/released-figures.ts";

interface Depth {
  /** How much of the ink covers the surface: one hue, so it reads in greyscale and in both themes. */
  opacity: number;
  /** The figure on it: dark on pale and pale on dark, 4.5 to 1 at the least in both themes. */
  figure: "fill-ink" | "fill-surface";
}

/** The more shops, the deeper. Not the temper scale: that shows position among peers alone. */
export const depths: Record<CountBand, Depth> = {
  "3-4": { opacity: 0.05, figure: "fill-ink" },
  "5-9": { opacity: 0.12, figure: "fill-ink" },
  "10-19": { opacity: 0.27, figure: "fill-ink" },
  "20-49": { opacity: 0.62, figure: "fill-surface" },
  "50+": { opacity: 0.88, figure: "fill-surface" },
};
