/**
 * A number as people write it, its unit already taken off: "45", ".125", "3,2", "2,400", "2 400", "2.400,5".
 * One comma is a decimal comma. Where figures run into thousands (a feed in mm/min), one comma or space before exactly
 * three digits groups thousands instead, unless the number begins with a zero. One full stop is always a decimal point:
 * "2.400" is 2.4, which as a feed falls below what is allowed and so cannot pass unseen.
 * @param inThousands  whether figures of this unit usually run into thousands
 * @returns null where it is no number written in one of these ways
 */
export function readDecimal(text: string, inThousands: boolean): number | null {
  const digits = ungrouped(text, inThousands);
  return /^(?:\d+\.?\d*|\.\d+)$/.test(digits) ? Number(digits) : null;
}

function ungrouped(text: string, inThousands: boolean): string {
  if (inThousands && /^[1-9]\d{0,2}(?:[ ,]\d{3})+(?:\.\d+)?$/.test(text)) return text.replace(/[ ,]/g, "");
  // Two groups, or a group and a decimal, can be read in one way only.
  if (/^[1-9]\d{0,2}(?:,\d{3}){2,}$|^[1-9]\d{0,2}(?:,\d{3})+\.\d+$/.test(text)) return text.replaceAll(",", "");
  if (/^[1-9]\d{0,2}(?:\.\d{3}){2,}$|^[1-9]\d{0,2}(?:\.\d{3})+,\d+$/.test(text)) {
    return text.replaceAll(".", "").replace(",", ".");
  }
  return /^\d*,\d+$/.test(text) ? text.replace(",", ".") : text;
}

/** A common fraction, alone or after a whole number: "1/8", "1 1/2", "1-1/4". Null where it is none. */
export function readFraction(text: string): number | null {
  const match = /^(?:(\d+)(?: ?- ?| ))?(\d+) ?\/ ?(\d+)$/.exec(text);
  if (!match || Number(match[3]) === 0) return null;
  return Number(match[1] ?? 0) + Number(match[2]) / Number(match[3]);
}
