import type { EditionRef, PeerGroupFigures, ReleasedDistribution } from "../contracts/released-figures.ts";
import type { Contribution } from "../peers/contribution.ts";
import { type PeerGroupKey, peerGroupId } from "../peers/peer-group.ts";
import { forEachMetric, type Metric } from "../recipes/metrics.ts";
import { requireThat } from "../stats/require-that.ts";
import { acceptableShare } from "./acceptable-share.ts";
import { countBandOf } from "./count-bands.ts";
import { figureSteps } from "./figure-steps.ts";
import { type Digest, type GroupMemory, plainDigest } from "./ledger.ts";
import type { DisclosureParameters } from "./parameters.ts";
import { distinctShops, meetsQuorum } from "./quorum.ts";
import { releaseDistribution } from "./release-distribution.ts";
import type { StepDecision } from "./three-shop-step.ts";

/**
 * The only way figures of a group leave the server: what an edition says of it.
 * Applies the quorum, tails, bands, rounding and three-shop rules, the last one to the group and again to each metric:
 * three shops may have changed in a group of which a single one changed its arc voltage.
 * @param contributions  all of one group; may be empty where the group was shown before
 * @param previous       what `rememberRelease` returned at the last published edition; null where nothing was ever shown
 * @throws RangeError when contributions of several groups are mixed, or neither they nor `previous` name the group
 */
export function releaseGroup(
  contributions: readonly Contribution[],
  previous: GroupMemory | null,
  parameters: DisclosureParameters,
  edition: EditionRef,
  digest: Digest = plainDigest,
): PeerGroupFigures {
  const key = keyOf(contributions, previous);
  if (!meetsQuorum(contributions, parameters)) return { status: "withheld", key, reason: "quorum" };
  const steps = figureSteps(contributions, previous, parameters, digest);
  if (steps.whole.decision === "withhold") return { status: "withheld", key, reason: "three-shop-step" };
  const old = previous?.figures;

  const distributionOf = (metric: Metric): ReleasedDistribution | null => {
    const giving = contributions.filter((c) => c.setpoints[metric] !== null);
    if (!meetsQuorum(giving, parameters)) return null;
    return byStep(steps[metric].decision, old?.distributions[metric], () =>
      releaseDistribution(metric, contributions, parameters, edition),
    );
  };
  const counted = {
    shops: countBandOf(distinctShops(contributions)),
    recipes: countBandOf(contributions.length),
    figuresFrom: edition,
  };
  const { shops, recipes, figuresFrom } = steps.whole.decision === "keep old figures" && old ? old : counted;
  return {
    status: "released",
    key,
    shops,
    recipes,
    figuresFrom,
    distributions: forEachMetric(distributionOf),
    acceptableShare: byStep(steps.acceptable.decision, old?.acceptableShare, () =>
      acceptableShare(contributions, parameters),
    ),
  };
}

function byStep<Figure>(
  decision: StepDecision,
  old: Figure | null | undefined,
  compute: () => Figure | null,
): Figure | null {
  if (decision === "withhold") return null;
  return decision === "release new" ? compute() : (old ?? null);
}

function keyOf(contributions: readonly Contribution[], previous: GroupMemory | null): PeerGroupKey {
  const key = contributions[0]?.key ?? previous?.figures.key;
  requireThat(key !== undefined, "releaseGroup needs contributions or earlier figures");
  const id = peerGroupId(key);
  const keys =
    previous === null ? contributions.map((c) => c.key) : [...contributions.map((c) => c.key), previous.figures.key];
  requireThat(
    keys.every((other) => peerGroupId(other) === id),
    "releaseGroup needs contributions of one group",
  );
  return key;
}
