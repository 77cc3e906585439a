import { TriangleAlert } from "lucide-react";
import { type CautionSubject, cautionsFor } from "#shared/safety/cautions.ts";
import { minimumShade } from "#shared/safety/eye-protection.ts";
import { TextLink } from "../ui/text-link.tsx";

/** The one line that goes with numbers to cut with on screen. The full list is a step away, and on every print. */
export function CautionsLine({ material, currentA }: CautionSubject) {
  const shade = currentA === null ? "Eyes behind a filter" : `Eyes behind shade ${minimumShade(currentA)} or darker`;
  const fume = material === "stainless-steel" ? " (chromium VI)" : material === "galvanised-steel" ? " (zinc)" : "";
  const water = material === "aluminium" ? " No aluminium left lying over a water table." : "";
  return (
    <p className="flex gap-2 text-sm text-soft">
      <TriangleAlert aria-hidden="true" size={16} className="mt-0.5 shrink-0 text-watch" />
      <span>
        {shade}, skin covered, fume extraction running{fume}, fire watch after.{water} The power source maker's manual
        comes first. <TextLink to="/cautions">All cautions</TextLink>
      </span>
    </p>
  );
}

/** All cautions in full, for paper. */
export function CautionsInFull(subject: CautionSubject) {
  return (
    <ul className="space-y-1 text-sm">
      {cautionsFor(subject).map(({ id, title, text, standards }) => (
        <li key={id}>
          <b>{title}.</b> {text}
          {standards.length > 0 ? ` (${standards.join(", ")})` : null}
        </li>
      ))}
    </ul>
  );
}
