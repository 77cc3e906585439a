import type { NetworkFigures, ReleasedGroup, ThicknessExponent } from "../contracts/released-figures.ts";
import { type Material, materials } from "../materials/materials.ts";
import { type Metric, metrics } from "../recipes/metrics.ts";
import { bandNominalMm } from "./peer-group.ts";

interface Point {
  /** Groups that differ in thickness alone: same nozzle, same gas. */
  series: string;
  logThickness: number;
  logMedian: number;
}

/** Fewest groups beyond the first of each series: with less, the exponent would follow single medians. */
const fewestFurtherGroups = 3;

/** The figures about the network as a whole that go with an edition: made from its released groups alone. */
export function networkFigures(groups: readonly ReleasedGroup[]): NetworkFigures {
  const exponents = materials.flatMap((material) =>
    metrics.flatMap((metric): ThicknessExponent[] => {
      const exponent = thicknessExponent(pointsOf(material, metric, groups));
      return exponent === null ? [] : [{ material, metric, exponent }];
    }),
  );
  return { exponents };
}

function pointsOf(material: Material, metric: Metric, groups: readonly ReleasedGroup[]): Point[] {
  return groups.flatMap(({ key, distributions }) => {
    const median = distributions[metric]?.quantiles.p50 ?? 0;
    if (key.material !== material || median <= 0) return [];
    const logThickness = Math.log(bandNominalMm(key.bandIndex));
    return [{ series: `${key.nozzleMm} ${key.gas}`, logThickness, logMedian: Math.log(median) }];
  });
}

/**
 * How does a metric follow thickness, the nozzle left alone? Least squares of log median on log thickness with one level
 * for each nozzle and gas and one slope for all. Assumes groups of equal standing.
 *   exponent = sum of (x - mean x)(y - mean y) / sum of (x - mean x)^2, means taken within each series
 * @returns unitless, to 0.01; null where too few groups share a nozzle and gas
 */
function thicknessExponent(points: readonly Point[]): number | null {
  const series = new Map<string, Point[]>();
  for (const point of points) series.set(point.series, [...(series.get(point.series) ?? []), point]);
  let across = 0;
  let along = 0;
  let furtherGroups = 0;
  for (const members of series.values()) {
    const meanX = members.reduce((sum, p) => sum + p.logThickness, 0) / members.length;
    const meanY = members.reduce((sum, p) => sum + p.logMedian, 0) / members.length;
    for (const p of members) {
      across += (p.logThickness - meanX) * (p.logMedian - meanY);
      along += (p.logThickness - meanX) ** 2;
    }
    furtherGroups += members.length - 1;
  }
  return furtherGroups < fewestFurtherGroups || along === 0 ? null : Math.round((100 * across) / along) / 100 + 0;
}
