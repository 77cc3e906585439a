import { drynessLabels, heightControlLabels, startMethodLabels } from "#shared/contracts/machines.ts";
import type { SharingPreview } from "#shared/contracts/sharing.ts";
import { materialLabels, processGasLabels } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useSession } from "../../shell/session.queries.ts";

type Listed = NonNullable<SharingPreview["listed"]>;

/** The nameless copy, field by field, as members would come to read it. */
export function ListedCopy({ listed }: { listed: Listed }) {
  const { units } = useSession();
  const traits = traitWords(listed);
  return (
    <>
      <dl>
        {copyFacts(listed, units).map(([name, value]) => (
          <div key={name} className="grid grid-cols-[8.5rem_1fr] gap-3 border-t border-line py-1.5 text-sm">
            <dt className="text-muted">{name}</dt>
            <dd className="min-w-0 break-words">{value}</dd>
          </div>
        ))}
      </dl>
      {traits.length > 0 ? (
        <p className="border-t border-line pt-2 text-sm">
          Of the machine, and only where enough shops have the same: {traits.join(", ")}.
        </p>
      ) : null}
    </>
  );
}

function copyFacts(listed: Listed, units: UnitSystem): [string, string][] {
  const [year, quarter] = listed.quarter.split("-Q");
  return [
    ["Metal", materialLabels[listed.material]],
    ["Thickness", formatWithUnit(listed.thicknessMm, "thickness", units)],
    ["Nozzle", formatWithUnit(listed.nozzleMm, "nozzle", units)],
    ["Gas", processGasLabels[listed.gas]],
    ...metrics.flatMap((metric): [string, string][] => {
      const value = listed.setpoints[metric];
      const { label, quantity } = metricDefinitions[metric];
      return value === null ? [] : [[label, formatWithUnit(value, quantity, units)]];
    }),
    ["Proven in", `Quarter ${quarter} of ${year}`],
    ["Words", listed.text ?? "None"],
  ];
}

function traitWords({ traits: { startMethod, dryness, heightControl } }: Listed): string[] {
  return [
    startMethod && `start of the arc (${startMethodLabels[startMethod].toLowerCase()})`,
    dryness && `drying of the air (${drynessLabels[dryness].toLowerCase()})`,
    heightControl && `height control (${heightControlLabels[heightControl].toLowerCase()})`,
  ].filter((words) => words !== null);
}
