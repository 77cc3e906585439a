import type { Metric } from "../recipes/metrics.ts";

export type Side = "high" | "low";

interface UsualSigns {
  /** What a setpoint out on this side usually goes with. */
  signs: string;
  /** Setpoints that are out together with it when one cause moves both, each with its side. */
  partners: Partial<Record<Metric, Side>>;
}

/** Common practice, no source: how cutters read a setpoint that is out. Signs to look for, not findings. */
export const usuallyGoesWith: Record<Metric, Record<Side, UsualSigns>> = {
  currentA: {
    high: {
      signs: "a wide kerf, rounded top edges and a nozzle that wears out quickly",
      partners: { feedMmMin: "high", kerfWidthMm: "high" },
    },
    low: {
      signs: "heavy dross at the bottom, lag and cuts that do not go through",
      partners: { feedMmMin: "low", kerfWidthMm: "low" },
    },
  },
  pressureBar: {
    high: { signs: "hard starts, a wandering arc and quick electrode wear", partners: { arcVoltageV: "high" } },
    low: {
      signs: "a soft arc, dross that clings, bevel and a nozzle that double-arcs",
      partners: { arcVoltageV: "low", kerfWidthMm: "high" },
    },
  },
  feedMmMin: {
    high: {
      signs: "thin high-speed dross, lag lines swept back and a cut that is lost",
      partners: { currentA: "high", arcVoltageV: "low" },
    },
    low: {
      signs: "heavy low-speed dross, a wide kerf and a melted bottom edge",
      partners: { currentA: "low", arcVoltageV: "high", kerfWidthMm: "high" },
    },
  },
  cutHeightMm: {
    high: {
      signs: "top bevel, a wide kerf and rounded top edges",
      partners: { arcVoltageV: "high", kerfWidthMm: "high" },
    },
    low: {
      signs: "a torch that touches, spatter on the nozzle and an undercut edge",
      partners: { arcVoltageV: "low", kerfWidthMm: "low" },
    },
  },
  pierceHeightMm: {
    high: { signs: "an arc that does not transfer or dies before it is through", partners: { pierceDelayS: "high" } },
    low: { signs: "blown-back metal on the nozzle and short nozzle life", partners: { cutHeightMm: "low" } },
  },
  pierceDelayS: {
    high: {
      signs: "a wide pierce hole, an arc that goes out over it and heat in thin sheet",
      partners: { pierceHeightMm: "high", currentA: "low" },
    },
    low: {
      signs: "a torch that moves off before the arc is through",
      partners: { pierceHeightMm: "low", currentA: "high" },
    },
  },
  arcVoltageV: {
    high: {
      signs: "a torch that rides high: top bevel and a wide kerf",
      partners: { cutHeightMm: "high", kerfWidthMm: "high", feedMmMin: "low" },
    },
    low: {
      signs: "a torch that rides low: touching, spatter and a narrow kerf",
      partners: { cutHeightMm: "low", kerfWidthMm: "low", feedMmMin: "high" },
    },
  },
  kerfWidthMm: {
    high: {
      signs: "a worn nozzle, a torch that rides high or a slow feed",
      partners: { cutHeightMm: "high", arcVoltageV: "high", feedMmMin: "low", currentA: "high" },
    },
    low: {
      signs: "a torch that rides low or a quick feed",
      partners: { cutHeightMm: "low", arcVoltageV: "low", feedMmMin: "high", currentA: "low" },
    },
  },
};
