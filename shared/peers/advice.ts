import type { ReleasedGroup } from "../contracts/released-figures.ts";
import { type Metric, metricDefinitions, metrics, type Setpoints } from "../recipes/metrics.ts";
import { isUnusual, type Standing, standingOf } from "./standing.ts";
import { type Side, usuallyGoesWith } from "./usual-signs.ts";

export interface MetricStanding {
  metric: Metric;
  value: number;
  standing: Standing;
}

/** One unusual setpoint with what to look at. */
export interface Check extends MetricStanding {
  /** What such a setpoint usually goes with: common practice, no source. */
  usually: string;
  /** Other setpoints of the same recipe that are out on the side that matches this one. */
  matching: MetricStanding[];
  /** What to make of it: never "wrong" where an acceptable test cut is on record. */
  verdict: string;
}

/** Standing of every setpoint that the group has figures for, most unusual first. */
export function standingsOf(setpoints: Setpoints, group: ReleasedGroup): MetricStanding[] {
  return metrics
    .flatMap((metric): MetricStanding[] => {
      const value = setpoints[metric];
      const distribution = group.distributions[metric];
      if (value === null || distribution === null) return [];
      return [{ metric, value, standing: standingOf(metric, value, distribution) }];
    })
    .sort((a, b) => Math.abs(b.standing.robustZ) - Math.abs(a.standing.robustZ));
}

/** What to check first: the unusual setpoints of a recipe, the furthest out first, each with what it usually goes with. */
export function checkFirst(setpoints: Setpoints, group: ReleasedGroup, hasAcceptableTestCut: boolean): Check[] {
  const standings = standingsOf(setpoints, group);
  return standings
    .filter(({ standing }) => isUnusual(standing))
    .map((own) => {
      const { signs, partners } = usuallyGoesWith[own.metric][sideOf(own.standing)];
      const matching = standings.filter((other) => isOut(other) && partners[other.metric] === sideOf(other.standing));
      return { ...own, usually: signs, matching, verdict: verdictOn(own, matching, hasAcceptableTestCut) };
    });
}

function sideOf(standing: Standing): Side {
  return standing.robustZ > 0 ? "high" : "low";
}

function isOut({ standing }: MetricStanding): boolean {
  return standing.word !== "typical";
}

function verdictOn(own: MetricStanding, matching: readonly MetricStanding[], hasAcceptableTestCut: boolean): string {
  if (hasAcceptableTestCut) return "Different, and it works for you.";
  const label = metricDefinitions[own.metric].label.toLowerCase();
  const partners = matching.map((m) => `${metricDefinitions[m.metric].label.toLowerCase()} (${sideOf(m.standing)})`);
  if (partners.length === 0) return `Check the ${label} first: no other setpoint explains it.`;
  return `Check the ${label} together with the ${partners.join(" and the ")}: they go together.`;
}
