import { type Material, materialLabels } from "../materials/materials.ts";
import { gaugeRange, gaugeThicknessMm } from "./gauges.ts";
import { memberUnits, mmPerInch, type TypedQuantity, typedUnits, type UnitSystem, unitSpellings } from "./units.ts";

export type ParsedQuantity = { ok: true; value: number } | { ok: false; problem: string };

const refuse = (problem: string): ParsedQuantity => ({ ok: false, problem });

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

/**
 * What a person typed, in the stored unit. Any unit of the quantity may be given; a bare number is in the member's own
 * unit, a bare fraction is inches. A gauge ("11 ga", "#11") is read by the material's own gauge system.
 * A single comma is a decimal comma ("3,2"), except before exactly three digits of a feed ("2,400 mm/min").
 */
export function parseQuantity(
  text: string,
  quantity: TypedQuantity,
  units: UnitSystem,
  options: { material?: Material } = {},
): ParsedQuantity {
  const typed = text.normalize("NFKC").replace(/⁄/g, "/").trim().toLowerCase();
  const unclear = refuse(`Not clear. Type it like ${examples[quantity][units]}`);
  if (typed === "") return unclear;
  if (/^[-−–]/.test(typed)) return refuse("A value below zero makes no sense here");

  const gauge = /^(?:#\s*(\d+)|(\d+)\s*(?:ga|ga\.|gauge|gage|g))$/.exec(typed);
  if (gauge) return parseGauge(Number(gauge[1] ?? gauge[2]), quantity, options.material);

  const parts = /^((?:\d+\s*[-\s]\s*)?\d+\s*\/\s*\d+|[\d.,\s]*\d[\d.,]*)\s*([^\d\s].*)?$/.exec(typed);
  const number = parts && readNumber(parts[1]!, quantity);
  if (!parts || number === null || !Number.isFinite(number)) return unclear;
  return inStoredUnit(number, parts[2], { quantity, units, fraction: parts[1]!.includes("/") });
}

function parseGauge(gauge: number, quantity: TypedQuantity, material: Material | undefined): ParsedQuantity {
  if (quantity !== "thickness") return refuse("A gauge number says sheet thickness, nothing else");
  if (!material) return refuse("Choose the metal first: each has its own gauge numbers");
  const value = gaugeThicknessMm(material, gauge);
  if (value !== null) return { ok: true, value };
  const name = materialLabels[material].toLowerCase();
  return refuse(`Gauges of ${name} go from ${gaugeRange.min} to ${gaugeRange.max} here`);
}

function readNumber(text: string, quantity: TypedQuantity): number | null {
  const fraction = /^(?:(\d+)\s*[-\s]\s*)?(\d+)\s*\/\s*(\d+)$/.exec(text);
  if (fraction) {
    const [, whole = "0", above, below] = fraction;
    return Number(below) === 0 ? null : Number(whole) + Number(above) / Number(below);
  }
  const plain = withDecimalPoint(text.replace(/(\d)\s+(?=\d{3}(?:\D|$))/g, "$1"), quantity);
  return plain !== null && /^(?:\d+\.?\d*|\.\d+)$/.test(plain) ? Number(plain) : null;
}

/** Decides which of point and comma groups thousands. Null where the writing is no number. */
function withDecimalPoint(text: string, quantity: TypedQuantity): string | null {
  if (/^[1-9]\d{0,2}(,\d{3})+(\.\d+)?$/.test(text)) {
    const groups = text.split(",").length - 1;
    const thousands = quantity === "feed" || groups > 1 || text.includes(".");
    return thousands ? text.replaceAll(",", "") : text.replace(",", ".");
  }
  if (/^[1-9]\d{0,2}(\.\d{3})+,\d+$/.test(text)) return text.replaceAll(".", "").replace(",", ".");
  return /^\d*,\d+$/.test(text) ? text.replace(",", ".") : text;
}

interface Writing {
  quantity: TypedQuantity;
  units: UnitSystem;
  fraction: boolean;
}

function inStoredUnit(
  number: number,
  unitText: string | undefined,
  { quantity, units, fraction }: Writing,
): ParsedQuantity {
  const isLength = quantity === "length" || quantity === "thickness" || quantity === "nozzle";
  if (unitText === undefined) {
    return {
      ok: true,
      value: fraction && isLength ? number * mmPerInch : number * memberUnits[quantity][units].factor,
    };
  }
  const spelled = unitText.replace(/[\s.]/g, "").replace(/per/g, "/");
  const unit = unitSpellings[spelled] ?? spelled;
  const factor = typedUnits[quantity][unit];
  if (factor !== undefined) return { ok: true, value: number * factor };
  const known = Object.values(typedUnits).some((table) => unit in table);
  const wanted = `Type it like ${examples[quantity][units]}`;
  return refuse(
    known ? `${unitText.trim()} measures something else. ${wanted}` : `Unknown unit ${unitText.trim()}. ${wanted}`,
  );
}
