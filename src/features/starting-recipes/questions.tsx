import { useState } from "react";
import type { Machine } from "#shared/contracts/machines.ts";
import { materialLabels, materials, processGases, processGasLabels } from "#shared/materials/materials.ts";
import { nozzleRangeMm, thicknessRangeMm } from "#shared/recipes/metrics.ts";
import { unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { type QuantityRule, reading } from "../../lib/quantity-text.ts";
import { QuantityField } from "../../ui/quantity-field.tsx";
import { Segmented } from "../../ui/segmented.tsx";
import { SelectField } from "../../ui/select-field.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import type { Answers, AnswersInUrl } from "./answers.ts";
import { useTypedLength } from "./use-typed-length.ts";

export interface QuestionsProps {
  url: AnswersInUrl;
  change: (patch: Partial<AnswersInUrl>) => void;
  answers: Answers;
  machines: readonly Machine[];
  units: UnitSystem;
}

export function Questions({ url, change, answers, machines, units }: QuestionsProps) {
  const { material, gas, machine } = answers;
  const rule: QuantityRule = { quantity: "thickness", units, range: thicknessRangeMm, material };
  const thickness = useTypedLength(url.thickness, rule);

  function chooseMetal(metal: string) {
    // A gauge means another thickness in another metal, so what was typed is read again.
    const named = materials.find((name) => name === metal) ?? material;
    change({ metal, thickness: thickness.type(thickness.text, { ...rule, material: named }) });
  }

  return (
    <form className="space-y-5 print:hidden" onSubmit={(event) => event.preventDefault()} aria-label="What to cut">
      <SelectField
        label="Metal"
        value={material}
        onChange={(event) => chooseMetal(event.target.value)}
        choices={materials.map((value) => ({ value, label: materialLabels[value] }))}
      />
      <QuantityField
        label="Thickness"
        hint="3 mm, 1/8 in, 11 ga"
        unit={unitLabel("thickness", units)}
        value={thickness.text}
        onValueChange={(text) => change({ thickness: thickness.type(text, rule) })}
        read={reading(rule)}
      />
      <NozzleQuestion url={url} change={change} units={units} />
      <div className="grid grid-cols-2 gap-4 lg:grid-cols-1 lg:gap-5">
        <SelectField
          label="Machine"
          value={machine.id}
          onChange={(event) => change({ machine: event.target.value })}
          choices={machines.map(({ id, name }) => ({ value: id, label: name }))}
        />
        <SelectField
          label="Process gas"
          value={gas}
          onChange={(event) => change({ gas: event.target.value })}
          choices={processGases.map((value) => ({ value, label: processGasLabels[value] }))}
        />
      </div>
      <p className="text-sm text-muted">
        <TextLink to="/method#starting">How the numbers come about</TextLink> ·{" "}
        <TextLink to="/cautions">Cautions</TextLink>
      </p>
    </form>
  );
}

const nozzleChoices = [
  { value: "advise", label: "Advise me" },
  { value: "own", label: "I choose" },
] as const;

function NozzleQuestion({ url, change, units }: Pick<QuestionsProps, "url" | "change" | "units">) {
  const rule: QuantityRule = { quantity: "nozzle", units, range: nozzleRangeMm };
  const nozzle = useTypedLength(url.nozzle, rule);
  const [asked, setAsked] = useState(false);
  const own = asked || url.nozzle !== "";

  function choose(value: (typeof nozzleChoices)[number]["value"]) {
    setAsked(value === "own");
    if (value === "advise") change({ nozzle: nozzle.type("", rule) });
  }

  return (
    <div className="space-y-3">
      <Segmented label="Nozzle" choices={nozzleChoices} value={own ? "own" : "advise"} onChange={choose} />
      {own ? (
        <QuantityField
          label="Nozzle orifice"
          hint="As marked on the nozzle. Until it is filled in, one is advised."
          unit={unitLabel("nozzle", units)}
          value={nozzle.text}
          onValueChange={(text) => change({ nozzle: nozzle.type(text, rule) })}
          read={reading(rule)}
        />
      ) : null}
    </div>
  );
}
