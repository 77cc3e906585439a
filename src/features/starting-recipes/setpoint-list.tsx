import { basisLabels, type StartingRecipe, type StartingSetpoint } from "#shared/contracts/starting-recipe-figures.ts";
import { type Metric, metricDefinitions, metrics } from "#shared/recipes/metrics.ts";
import { formatQuantity, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { classNames } from "../../ui/class-names.ts";

/** The numbers to dial in, each with its range and what it stands on. */
export function SetpointList({ setpoints, units }: { setpoints: StartingRecipe["setpoints"]; units: UnitSystem }) {
  return (
    <section aria-label="Setpoints">
      <ul>
        {metrics.map((metric) => (
          <SetpointRow key={metric} metric={metric} setpoint={setpoints[metric]} units={units} />
        ))}
      </ul>
    </section>
  );
}

interface SetpointRowProps {
  metric: Metric;
  setpoint: StartingSetpoint;
  units: UnitSystem;
}

function SetpointRow({ metric, setpoint, units }: SetpointRowProps) {
  const { label } = metricDefinitions[metric];
  const isKnown = setpoint.value !== null;
  return (
    <li className={rowClasses}>
      <h3 className="font-bold md:pt-0.5 print:pt-0">{label}</h3>
      <div className="text-right print:contents">
        <p className="figures text-xl font-black print:text-right print:text-base">
          {valueText(setpoint, metric, units)}{" "}
          {isKnown ? <span className="text-sm font-normal text-muted">{unitOf(metric, units)}</span> : null}
        </p>
        <p className="figures text-sm text-soft print:text-left">{rangeText(setpoint, metric, units)}</p>
      </div>
      <div className="col-span-2 md:col-span-1 md:pt-0.5 print:col-span-1 print:pt-0 print:text-sm">
        <p>{basisWords(setpoint)}</p>
        {isKnown ? <Steps setpoint={setpoint} /> : <Test setpoint={setpoint} />}
      </div>
    </li>
  );
}

/** On paper one line a setpoint: name, value, range, what it stands on. */
const rowClasses = classNames(
  "grid grid-cols-[1fr_auto] gap-x-4 gap-y-1 border-t border-line py-3 last:border-b",
  "md:grid-cols-[8rem_9.5rem_minmax(0,1fr)] md:gap-x-6",
  "print:grid-cols-[7rem_7rem_10rem_minmax(0,1fr)] print:items-baseline print:gap-x-4 print:py-px",
);

/** The test that finds what nobody knows. */
function Test({ setpoint: { steps } }: { setpoint: StartingSetpoint }) {
  return steps.map(({ text }) => (
    <p key={text} className="text-sm text-soft print:leading-tight">
      {text}
    </p>
  ));
}

function Steps({ setpoint: { steps } }: { setpoint: StartingSetpoint }) {
  return (
    <details className="text-sm print:hidden">
      <summary className="inline-flex min-h-6 items-center text-action underline decoration-1 underline-offset-2 pointer-coarse:min-h-touch">
        How this number came about
      </summary>
      <ol className="mt-1 list-decimal space-y-1 pl-5 text-soft">
        {steps.map(({ text }) => (
          <li key={text}>{text}</li>
        ))}
      </ol>
    </details>
  );
}

/** Where a number comes from, in words. */
function basisWords({ basis, evidence }: StartingSetpoint): string {
  return basis === "peers" || basis === "neighbours" ? `${basisLabels[basis]}: ${evidence}` : evidence;
}

const unitOf = (metric: Metric, units: UnitSystem) => unitLabel(metricDefinitions[metric].quantity, units);

function figure(value: number, metric: Metric, units: UnitSystem): string {
  return formatQuantity(value, metricDefinitions[metric].quantity, units).text;
}

function valueText({ value }: StartingSetpoint, metric: Metric, units: UnitSystem): string {
  return value === null ? "–" : figure(value, metric, units);
}

function rangeText({ low, high }: StartingSetpoint, metric: Metric, units: UnitSystem): string | null {
  if (low === null || high === null) return null;
  return `${figure(low, metric, units)} to ${figure(high, metric, units)} ${unitOf(metric, units)}`;
}
