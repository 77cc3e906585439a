import type { RecipeContent } from "#shared/contracts/recipes.ts";
import type { UnitSystem } from "#shared/units/units.ts";
import { classNames } from "../../ui/class-names.ts";
import { contentFacts } from "./content-facts.ts";

export interface FactsBesideProps {
  left: { heading: string; content: RecipeContent };
  right: { heading: string; content: RecipeContent };
  units: UnitSystem;
  machineName: (id: string) => string;
  /** Leaves out what is the same on both sides. */
  differingOnly?: boolean;
}

/** Two contents side by side; what differs is marked by a bar and by weight, and said to screen readers. */
export function FactsBeside({ left, right, units, machineName, differingOnly }: FactsBesideProps) {
  const [before, after] = [left, right].map(({ content }) => contentFacts(content, units, machineName));
  return (
    <table className="w-full table-fixed border-separate border-spacing-0">
      <thead>
        <tr className="text-left text-sm">
          <th scope="col" className="w-[30%] border-b border-line py-2 font-normal text-muted">
            Setting
          </th>
          {[left, right].map(({ heading }) => (
            <th key={heading} scope="col" className="border-b border-line px-3 py-2 font-bold">
              {heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {before!.map(({ name, value }, i) => {
          const other = after![i]!.value; // both list the same facts
          const differs = value !== other;
          if (differingOnly && !differs) return null;
          return (
            <tr key={name} className={differs ? "bg-action-soft" : undefined}>
              <th
                scope="row"
                className={classNames(
                  "border-b border-l-4 border-b-line py-1.5 pl-2 text-left",
                  differs ? "border-l-action font-bold" : "border-l-transparent font-normal text-muted",
                )}
              >
                {name}
                {differs ? (
                  <>
                    {" "}
                    <span className="sr-only">(differs)</span>
                  </>
                ) : null}
              </th>
              <FactCell text={value} differs={differs} />
              <FactCell text={other} differs={differs} />
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

function FactCell({ text, differs }: { text: string; differs: boolean }) {
  return <td className={classNames("border-b border-line px-3 py-1.5 break-words", differs && "font-bold")}>{text}</td>;
}
