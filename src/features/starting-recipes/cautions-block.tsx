import { TriangleAlert } from "lucide-react";
import type { Caution } from "#shared/contracts/starting-recipe-figures.ts";

/** The cautions that go with the numbers, those for this metal and gas first. */
export function CautionsBlock({ cautions }: { cautions: readonly Caution[] }) {
  return (
    <section
      aria-labelledby="cautions"
      className="rounded border border-l-4 border-watch bg-watch-soft px-4 py-3 print:px-3 print:py-1.5"
    >
      <h2 id="cautions" className="flex items-center gap-2 font-bold text-watch">
        <TriangleAlert aria-hidden="true" size={20} />
        Before the arc is on
      </h2>
      <ul className="mt-2 gap-x-8 space-y-2 text-sm md:columns-2 print:mt-1 print:columns-2 print:space-y-0.5 print:leading-tight">
        {cautions.map(({ id, title, text, standards }) => (
          <li key={id} className="break-inside-avoid">
            <b>{title}.</b> {text}
            {standards.length > 0 ? <span className="text-soft"> {standards.join(", ")}</span> : null}
          </li>
        ))}
      </ul>
    </section>
  );
}
