import type { Metric } from "./metrics.ts";

/** The test that finds a setpoint where neither peers nor practice know it. Common practice, no source. */
export const testThatFinds: Record<Metric, string> = {
  currentA:
    "Take the current marked on the nozzle or in the maker's manual, then cut a series 10 % to either side of it.",
  pressureBar: "Take the pressure from the torch maker's manual, read it at the torch while the gas flows.",
  feedMmMin:
    "Cut a series of straight lines, each quicker than the last, until the cut no longer goes through; keep the one with the least dross.",
  cutHeightMm: "Cut a series of heights and keep the one with the squarest edge.",
  pierceHeightMm: "Raise it from the cut height until no metal blows back on the nozzle and the arc still transfers.",
  pierceDelayS: "Start at 0 s and add 0.1 s at a time until the arc is through before the torch moves.",
  arcVoltageV: "Cut at a good height with height control only observing, read the average arc voltage, and hold that.",
  kerfWidthMm: "Cut a slot, measure its width at the top with a feeler gauge, and enter that.",
};
