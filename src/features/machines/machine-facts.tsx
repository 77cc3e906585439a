import { drynessLabels, heightControlLabels, type Machine, startMethodLabels } from "#shared/contracts/machines.ts";
import { formatQuantity, type TypedQuantity } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

/** A machine's description to read. */
export function MachineFacts({ machine, units }: { machine: Machine; units: UnitSystem }) {
  const shown = (value: number | null, quantity: TypedQuantity) => {
    if (value === null) return "Not said";
    const { text, unit } = formatQuantity(value, quantity, units);
    return `${text} ${unit}`;
  };
  const facts = [
    ["Largest current", shown(machine.powerSourceMaxCurrentA, "current")],
    ["How the arc starts", startMethodLabels[machine.startMethod]],
    ["Air pressure at the torch", shown(machine.torchPressureBar, "pressure")],
    ["How the air is dried", drynessLabels[machine.dryness]],
    ["Height control", heightControlLabels[machine.heightControl]],
    ["Its readings a second", machine.heightControlSampleHz ?? "Not said"],
    ["Top feed", shown(machine.topFeedMmMin, "feed")],
    ["Note to self", machine.note || "None"],
  ] as const;
  return (
    <dl className="max-w-lg">
      {facts.map(([name, value]) => (
        <div key={name} className="flex justify-between gap-4 border-b border-line py-2">
          <dt className="text-muted">{name}</dt>
          <dd className="figures text-right">{value}</dd>
        </div>
      ))}
    </dl>
  );
}
