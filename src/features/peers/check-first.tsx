import type { Recipe } from "#shared/contracts/recipes.ts";
import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import { type Check, checkFirst, type MetricStanding, standingsOf } from "#shared/peers/advice.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { listWords } from "./peer-words.ts";

/** More than this is no longer "first". */
const most = 3;

/** What of the own recipe to look at first, from released figures and the own values alone. */
export function CheckFirst({ group, own }: { group: ReleasedGroup; own: Recipe | undefined }) {
  if (!own) return <p>You have no recipe in this group. With one, this place says which of its setpoints are odd.</p>;
  const { setpoints } = own.version.content;
  const checks = checkFirst(setpoints, group, own.version.proven).slice(0, most);
  const standings = standingsOf(setpoints, group);
  if (standings.length === 0) return <p>Your recipe fills in nothing that has figures here.</p>;
  return (
    <>
      {checks.length === 0 ? <p>Nothing stands out.</p> : null}
      {checks.map((check) => (
        <CheckText key={check.metric} check={check} />
      ))}
      <Leaning standings={standings.filter(({ metric }) => !checks.some((check) => check.metric === metric))} />
      {own.version.proven && checks.length > 0 ? (
        <p>It has an acceptable test cut: different, and it works for you.</p>
      ) : null}
    </>
  );
}

function CheckText({ check: { metric, standing, usually, verdict, matching } }: { check: Check }) {
  const isPraise = verdict.startsWith("Different");
  const partners = matching.map((m) => `${nameOf(m)} (${m.standing.word})`);
  return (
    <p>
      <b className="text-ink">
        {metricDefinitions[metric].label} is {standing.word}.
      </b>{" "}
      That usually goes with {usually}. {isPraise ? null : verdict}
      {isPraise && partners.length > 0 ? `It goes together with ${listWords(partners)}.` : null}
    </p>
  );
}

/** Setpoints that lean to one side without being unusual. */
function Leaning({ standings }: { standings: readonly MetricStanding[] }) {
  const on = (word: "high" | "low") => standings.filter(({ standing }) => standing.word === word).map(nameOf);
  const sides = (["high", "low"] as const).flatMap((side) => {
    const names = on(side);
    return names.length > 0 ? [`On the ${side} side, within what is usual: ${listWords(names)}.`] : [];
  });
  return sides.length > 0 ? <p>{sides.join(" ")}</p> : null;
}

const nameOf = ({ metric }: MetricStanding) => metricDefinitions[metric].label.toLowerCase();
