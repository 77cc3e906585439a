import { type Material, materialLabels } from "../materials/materials.ts";
import { gaugeRange, gaugeThicknessMm } from "./gauges.ts";
import { readDecimal, readFraction } from "./read-number.ts";
import { plainUnit } from "./spellings.ts";
import { isLength, memberUnits, mmPerInch, type TypedQuantity, typedUnits, type UnitSystem } from "./units.ts";

export type ParsedQuantity = { ok: true; value: number } | { ok: false; problem: string };

const refuse = (problem: string): ParsedQuantity => ({ ok: false, problem });
/** Twelve figures: takes away what binary arithmetic adds, so that 1/8 in is 3.175 mm. */
const accept = (value: number): ParsedQuantity => ({ ok: true, value: Number(value.toPrecision(12)) });

const examples: Record<TypedQuantity, Record<UnitSystem, string>> = {
  current: { metric: "45 A", inch: "45 A" },
  voltage: { metric: "103.5 V", inch: "103.5 V" },
  delay: { metric: "0.4 s", inch: "0.4 s" },
  pressure: { metric: "4.5 bar", inch: "65 psi" },
  feed: { metric: "2400 mm/min", inch: "95 in/min" },
  length: { metric: "1.5 mm", inch: "0.06 in" },
  thickness: { metric: "3 mm", inch: "1/8 in" },
  nozzle: { metric: "0.8 mm", inch: "0.8 mm" },
};

const kinds: Record<TypedQuantity, string> = {
  current: "a current",
  voltage: "a voltage",
  delay: "a time",
  pressure: "a pressure",
  feed: "a speed",
  length: "a length",
  thickness: "a length",
  nozzle: "a length",
};

interface Field {
  quantity: TypedQuantity;
  units: UnitSystem;
}

const typeItLike = ({ quantity, units }: Field) => `Type it like ${examples[quantity][units]}`;

/**
 * What a person typed, in the stored unit. Any unit of the quantity may be given; a bare number is in the member's own
 * unit, a bare fraction is inches. A gauge ("11 ga", "#11") is read by the material's own gauge system. How commas are
 * read is told at `readDecimal`. Does not check limits.
 */
export function parseQuantity(
  text: string,
  quantity: TypedQuantity,
  units: UnitSystem,
  options: { material?: Material } = {},
): ParsedQuantity {
  const typed = tidy(text);
  if (typed === "") return refuse(`Nothing typed. ${typeItLike({ quantity, units })}`);
  if (/^- ?[\d.,]/.test(typed)) return refuse("This cannot be below zero");
  if (/^[\d.,]+(?: ?[a-z/"]+)? ?(?:-|to) ?[\d.,]+(?! ?\/)(?: ?[a-z/"]+)?$/i.test(typed)) {
    return refuse(`Give one figure, not a range. ${typeItLike({ quantity, units })}`);
  }
  const gauge = /^(?:# ?(\d+)|(\d+) ?(?:ga|ga\.|gauge|gage|g))$/i.exec(typed);
  if (gauge) return parseGauge(Number(gauge[1] ?? gauge[2]), quantity, options.material);
  return parseFigure(typed, { quantity, units });
}

/** Single spaces, plain quotes, dashes and fractions: "1½″" becomes 1 1/2". */
function tidy(text: string): string {
  return text
    .replace(/[¼-¾⅐-⅞]/g, " $&") // before NFKC, which would make 1½ into 11/2
    .replace(/[″“”]|''|′′|’’/g, '"')
    .replace(/[′’]/g, "'")
    .normalize("NFKC")
    .replaceAll("⁄", "/")
    .replace(/[−–—‐‑]/g, "-")
    .replace(/\s+/g, " ")
    .trim();
}

function parseGauge(gauge: number, quantity: TypedQuantity, material: Material | undefined): ParsedQuantity {
  if (quantity !== "thickness") return refuse("A gauge number says sheet thickness, nothing else");
  if (!material) return refuse("Choose the metal first: each has its own gauge numbers");
  const value = gaugeThicknessMm(material, gauge);
  if (value !== null) return { ok: true, value };
  const { min, max } = gaugeRange(material);
  return refuse(
    `Gauges of ${materialLabels[material].toLowerCase()} go from ${min} to ${max}. Type the thickness itself`,
  );
}

function parseFigure(typed: string, field: Field): ParsedQuantity {
  const unclear = refuse(`Not clear. ${typeItLike(field)}`);
  const parts = /^([\d., ]*\d[.,]?(?: ?- ?\d+)?(?: ?\/ ?\d+)?) ?([^\d .,].*)?$/.exec(typed);
  if (!parts) return unclear;
  const [, figure = "", unitText] = parts;
  const unit = unitText === undefined ? null : plainUnit(unitText);
  const problem = unit === null ? null : unitProblem(unit, unitText!, field);
  if (problem !== null) return refuse(problem);

  if (figure.includes("/")) return parseFraction(figure, unit, field);
  const factor = unit === null ? memberUnits[field.quantity][field.units].factor : typedUnits[field.quantity][unit]!;
  const number = readDecimal(figure, runsIntoThousands(unit, field.quantity));
  return number === null || !Number.isFinite(number * factor) ? unclear : accept(number * factor);
}

/** Shops write fractions of an inch and of nothing else. */
function parseFraction(figure: string, unit: string | null, field: Field): ParsedQuantity {
  if (!isLength(field.quantity)) return refuse(`A fraction is for inches only. ${typeItLike(field)}`);
  if (unit !== null && unit !== "in")
    return refuse("A fraction is in inches. In another unit write a decimal, as 3.2 mm");
  const number = readFraction(figure);
  return number === null ? refuse(`Not clear. ${typeItLike(field)}`) : accept(number * mmPerInch);
}

function runsIntoThousands(unit: string | null, quantity: TypedQuantity): boolean {
  if (unit === null) return quantity === "feed";
  return ["mm/min", "in/min", "ms"].includes(unit);
}

function unitProblem(unit: string, typed: string, field: Field): string | null {
  if (Object.hasOwn(typedUnits[field.quantity], unit)) return null;
  if (unit === "mil" || unit === "mils") return "A mil may be 0.001 in or a millimetre. Type thou, in or mm";
  const meant = (Object.keys(typedUnits) as TypedQuantity[]).find((other) => Object.hasOwn(typedUnits[other], unit));
  const wrong = meant ? `${typed} is ${kinds[meant]}` : `${typed} is no unit known here`;
  return `${wrong}. ${typeItLike(field)}`;
}
