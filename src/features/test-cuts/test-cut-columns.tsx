import { type TestCut, topEdgeLabels } from "#shared/contracts/test-cuts.ts";
import { formatInstant, formatShortDate } from "#shared/units/dates.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { recipeName } from "../../lib/recipe-words.ts";
import type { Column } from "../../ui/table.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { TestCutVerdict } from "./test-cut-verdict.tsx";
import { drossLabels, measuredWords, seenWords } from "./test-cut-words.ts";

export function testCutColumns(units: UnitSystem): Column<TestCut>[] {
  return [
    { key: "when", header: "When", cell: (cut) => <span className="figures">{formatShortDate(cut.cutAt)}</span> },
    {
      key: "recipe",
      header: "Recipe",
      rowHeader: true,
      cell: (cut) => <TextLink to={`/recipes/${cut.recipeId}`}>{recipeName(cut, units)}</TextLink>,
    },
    {
      key: "machine",
      header: "Machine",
      cell: (cut) => (
        <>
          {cut.machineName}
          <span className="block text-sm text-muted">Version {cut.versionNumber}</span>
        </>
      ),
    },
    { key: "outcome", header: "Outcome", cell: (cut) => <TestCutVerdict acceptable={cut.acceptable} /> },
    { key: "dross", header: "Dross", cell: (cut) => (cut.cutThrough ? drossLabels[cut.dross] : "Not cut through") },
    { key: "edge", header: "Top edge", cell: (cut) => topEdgeLabels[cut.topEdge] },
    {
      key: "measured",
      header: "Measured",
      cell: (cut) => <Measured words={measuredWords(cut, units)} />,
    },
  ];
}

/** One to a line: a figure parted from its unit is misread. */
function Measured({ words }: { words: readonly string[] }) {
  if (words.length === 0) return "–";
  return words.map((word) => (
    <span key={word} className="block text-sm whitespace-nowrap">
      {word}
    </span>
  ));
}

export function TestCutCard({ cut, units }: { cut: TestCut; units: UnitSystem }) {
  const measured = measuredWords(cut, units);
  return (
    <>
      <TestCutVerdict acceptable={cut.acceptable} />
      <p>
        <TextLink to={`/recipes/${cut.recipeId}`} className="font-bold">
          {recipeName(cut, units)}
        </TextLink>
      </p>
      <p>{seenWords(cut)}.</p>
      {measured.length > 0 ? <p className="text-sm text-soft">Measured: {measured.join(", ")}.</p> : null}
      <p className="text-sm text-muted">
        {formatInstant(cut.cutAt)} · {cut.machineName} · version {cut.versionNumber}
        {cut.recordedBy ? ` · ${cut.recordedBy}` : ""}
      </p>
    </>
  );
}
