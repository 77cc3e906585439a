import { type HeatCheckInput, type HeatVerdict, heatCheck } from "#shared/materials/heat-check.ts";
import { Notice, type NoticeKind } from "../../ui/notice.tsx";

const kinds: Record<HeatVerdict, NoticeKind> = { impossible: "stop", high: "watch", low: "watch", plausible: "sound" };
const titles: Record<HeatVerdict, string> = {
  impossible: "Heat check: this cannot be",
  high: "Heat check: hardly enough heat",
  low: "Heat check: far more heat than needed",
  plausible: "Heat check: plausible",
};

/** Whether the arc can melt the kerf at this feed. Catches figures typed in the wrong unit. */
export function HeatNote(input: HeatCheckInput) {
  const check = heatCheck(input);
  if (!check) {
    return (
      <p className="text-sm text-muted">Heat check: needs thickness, current, arc voltage, feed rate and kerf width.</p>
    );
  }
  return (
    <Notice kind={kinds[check.verdict]} title={titles[check.verdict]}>
      <p className="text-sm">{check.words}</p>
    </Notice>
  );
}
