import type { Setpoints } from "../recipes/metrics.ts";
import type { PeerGroupKey } from "./peer-group.ts";

/** A shared, proven recipe as the network counts it. Shop and machine are opaque numbers that mean nothing elsewhere. */
export interface Contribution {
  shop: number;
  machine: number;
  key: PeerGroupKey;
  thicknessMm: number;
  /** In stored units; null where the shop has not filled one in. */
  setpoints: Setpoints;
  acceptedCuts: number;
  testCuts: number;
}
