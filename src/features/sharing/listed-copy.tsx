import { drynessLabels, heightControlLabels, startMethodLabels } from "#shared/contracts/machines.ts";
import type { SharingPreview } from "#shared/contracts/sharing.ts";
import { materialLabels, processGasLabels } from "#shared/materials/materials.ts";
import { metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatWithUnit } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { useSession } from "../../shell/session.queries.ts";

type Listed = NonNullable<SharingPreview["listed"]>;
type Fact = readonly [name: string, value: string];

/** The nameless copy, field by field, as members would come to read it. */
export function ListedCopy({ listed }: { listed: Listed }) {
  const { units } = useSession();
  const traits = traitFacts(listed);
  return (
    <>
      <Facts facts={copyFacts(listed, units)} />
      {traits.length > 0 ? (
        <>
          <p className="mt-3 mb-2 text-sm">Of the machine, and only where enough shops have the same:</p>
          <Facts facts={traits} />
        </>
      ) : null}
    </>
  );
}

function Facts({ facts }: { facts: readonly Fact[] }) {
  return (
    <dl>
      {facts.map(([name, value]) => (
        <div key={name} className="grid grid-cols-[8.5rem_1fr] gap-3 border-t border-line py-1.5 text-sm">
          <dt className="text-muted">{name}</dt>
          <dd className="min-w-0 break-words">{value}</dd>
        </div>
      ))}
    </dl>
  );
}

function copyFacts(listed: Listed, units: UnitSystem): Fact[] {
  const [year, quarter] = listed.quarter.split("-Q");
  return [
    ["Metal", materialLabels[listed.material]],
    ["Thickness", formatWithUnit(listed.thicknessMm, "thickness", units)],
    ["Nozzle", formatWithUnit(listed.nozzleMm, "nozzle", units)],
    ["Gas", processGasLabels[listed.gas]],
    ...metrics.flatMap((metric): Fact[] => {
      const value = listed.setpoints[metric];
      const { label, quantity } = metricDefinitions[metric];
      return value === null ? [] : [[label, formatWithUnit(value, quantity, units)]];
    }),
    ["Proven in", `Quarter ${quarter} of ${year}`],
    ["Words", listed.text ?? "None"],
  ];
}

function traitFacts({ traits: { startMethod, dryness, heightControl } }: Listed): Fact[] {
  return [
    ...(startMethod ? [["Start of the arc", startMethodLabels[startMethod]] as const] : []),
    ...(dryness ? [["Drying of the air", drynessLabels[dryness]] as const] : []),
    ...(heightControl ? [["Height control", heightControlLabels[heightControl]] as const] : []),
  ];
}
