import type { PublishedEdition } from "#shared/contracts/editions.ts";
import type { ReleasedGroup } from "#shared/contracts/released-figures.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatDate } from "#shared/units/dates.ts";
import { TextLink } from "../../ui/text-link.tsx";
import { listWords } from "./peer-words.ts";

/** Which figures are older than the edition shown, and why they were held. */
export function HeldNote({ group, edition }: { group: ReleasedGroup; edition: PublishedEdition }) {
  const held = heldByEdition(group, edition);
  if (held.length === 0) return null;
  const parts = held.map(({ date, names }) => `${names} from the edition of ${formatDate(date)}`);
  return (
    <p className="max-w-text text-sm text-soft">
      Held figures: {parts.join("; ")}. Too few shops changed there since for new ones to be safe to show.{" "}
      <TextLink to="/method#rules">The rule</TextLink>
    </p>
  );
}

interface Held {
  date: string;
  /** "feed rate and arc voltage", or "all figures". */
  names: string;
}

function heldByEdition({ distributions }: ReleasedGroup, edition: PublishedEdition): Held[] {
  const shown = metrics.flatMap((metric) => {
    const from = distributions[metric]?.figuresFrom;
    return from ? [{ metric, from }] : [];
  });
  const dates = [...new Set(shown.filter(({ from }) => from.number < edition.number).map(({ from }) => from.date))];
  return dates.sort().map((date) => {
    const members = shown.filter(({ from }) => from.date === date);
    const names = members.map(({ metric }) => metricDefinitions[metric].label.toLowerCase());
    return { date, names: members.length === shown.length ? "all figures" : listWords(names) };
  });
}
