import type { TestPlanStep } from "#shared/contracts/starting-recipe-figures.ts";
import { metricDefinitions } from "#shared/recipes/metrics.ts";
import { formatQuantity, unitLabel } from "#shared/units/format.ts";
import type { UnitSystem } from "#shared/units/units.ts";

/** Which coupons to cut, one setpoint at a time. */
export function TestPlan({ steps, units }: { steps: readonly TestPlanStep[]; units: UnitSystem }) {
  const coupons = steps.reduce((sum, step) => sum + step.coupons, 0);
  return (
    <section aria-labelledby="test-plan">
      <h2 id="test-plan" className="text-lg font-black">
        First test plan
      </h2>
      <p className="max-w-text text-soft print:text-sm">
        {coupons} coupons in all. One setpoint changes at a time, in an order in which each step leans on the one
        before.
      </p>
      <ol className="mt-3 space-y-3 print:mt-1 print:columns-2 print:space-y-1 print:text-sm print:leading-tight">
        {steps.map((step) => (
          <Step key={step.order} step={step} units={units} />
        ))}
      </ol>
    </section>
  );
}

function Step({ step, units }: { step: TestPlanStep; units: UnitSystem }) {
  return (
    <li className="grid max-w-2xl grid-cols-[1.75rem_1fr] break-inside-avoid print:grid-cols-[1.25rem_1fr]">
      <span className="figures font-black" aria-hidden="true">
        {step.order}
      </span>
      <div>
        <h3 className="font-bold">
          {step.title}
          {step.coupons > 0 ? <span className="font-normal text-muted"> · {couponWords(step.coupons)}</span> : null}
        </h3>
        <p className="print:inline">{step.instruction} </p>
        {step.levels.length > 0 ? <p className="font-bold print:inline">{levelWords(step, units)}. </p> : null}
        <p className="text-soft print:inline">Go on when: {lowerFirst(step.keepWhen)}</p>
      </div>
    </li>
  );
}

const couponWords = (coupons: number) => (coupons === 1 ? "1 coupon" : `${coupons} coupons`);

/** "2,040 · 2,210 · 2,400 mm/min". */
function levelWords({ levels, varies }: TestPlanStep, units: UnitSystem): string {
  if (varies === null) return levels.join(" · ");
  const { label, quantity } = metricDefinitions[varies];
  const figures = levels.map((level) => formatQuantity(level, quantity, units).text);
  return `${label}: ${figures.join(" · ")} ${unitLabel(quantity, units)}`;
}

const lowerFirst = (text: string) => text.charAt(0).toLowerCase() + text.slice(1);
