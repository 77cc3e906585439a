import { useState } from "react";
import { editText } from "#shared/units/format.ts";
import { type QuantityRule, readQuantity } from "../../lib/quantity-text.ts";

export interface TypedLength {
  /** What stands in the field. */
  text: string;
  /** Keeps what was typed and gives what it means in mm, as text for the URL; empty where it cannot be read. */
  type: (text: string, rule: QuantityRule) => string;
}

/**
 * A field whose meaning, in mm, is kept elsewhere. It shows what was typed as long as that is what is kept; when the kept
 * value changes by other means, by a link, the field follows.
 */
export function useTypedLength(
  kept: string,
  { quantity, units }: Pick<QuantityRule, "quantity" | "units">,
): TypedLength {
  const written = kept === "" || !(Number(kept) > 0) ? "" : editText(Number(kept), quantity, units);
  const [typed, setTyped] = useState({ text: written, means: kept });
  return {
    text: typed.means === kept ? typed.text : written,
    type(text, rule) {
      const read = readQuantity(text, rule);
      const means = read.ok ? String(read.value) : "";
      setTyped({ text, means });
      return means;
    },
  };
}
