import { type Metric, metricDefinitions } from "../recipes/metrics.ts";

/** A metric's value on the scale it is summarised on: natural logs for feed and kerf, as it is for the rest. */
export function toScale(metric: Metric, value: number): number {
  return metricDefinitions[metric].logScale ? Math.log(value) : value;
}

/** Back from `toScale`, in the metric's stored unit. */
export function fromScale(metric: Metric, scaled: number): number {
  return metricDefinitions[metric].logScale ? Math.exp(scaled) : scaled;
}
