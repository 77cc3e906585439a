import { isSpelled, longName, plainLetters, wordsOf } from "./spelled-names.ts";

/** Why a text may not be shared; in the order they are looked for. */
export type TextRefusal = "e-mail" | "phone" | "link" | "shop-name" | "person-name" | "machine-name";

export const textRefusalWords: Record<TextRefusal, string> = {
  "e-mail": "It holds an e-mail address",
  phone: "It holds what looks like a phone number",
  link: "It holds a link or an account name",
  "shop-name": "It holds your shop's name or part of it",
  "person-name": "It holds the name of somebody at your shop",
  "machine-name": "It holds the name of one of your machines",
};

export interface OwnNames {
  shop: string;
  people: readonly string[];
  machines?: readonly string[];
}

/** Words half the trade has in its name: they tell nobody apart. */
const tradeWords = new Set(
  `and the of for company shop works work fab fabs fabrication fabricating fabricators metal metals metalwork metalworks
  steel iron plate sheet aluminium aluminum copper brass plasma cut cuts cutting weld welding welders machine machining
  custom design designs art repair service services industries industrial manufacturing engineering forge tools limited`
    .split(/\s+/)
    .filter(Boolean),
);

/**
 * Screens what an owner wrote for other members to read beside a listed recipe.
 * Looks for what would name the shop or its people or lead to them, also in full-width or lookalike letters, with accents,
 * invisible characters or digits for letters, or in pieces. It cannot know every hint a text may give: the owner sees the text as others will before it goes.
 * @returns every reason to refuse it; none when it may be shared
 */
export function screenText(text: string, own: OwnNames): TextRefusal[] {
  const plain = plainLetters(text);
  const found: Record<TextRefusal, boolean> = {
    "e-mail": holdsEmail(plain),
    phone: holdsPhone(plain),
    link: holdsLink(plain),
    "shop-name": holdsShopName(plain, own.shop),
    "person-name": own.people.some((person) => holdsPerson(plain, person)),
    "machine-name": (own.machines ?? []).some((machine) => holdsMachine(plain, machine)),
  };
  return (Object.keys(found) as TextRefusal[]).filter((reason) => found[reason]);
}

const topDomain =
  "com|net|org|info|biz|shop|store|io|co|us|uk|ca|eu|de|fr|it|es|nl|au|nz|me|tv|app|online|site|tech|pro|dev|xyz|ai|ie|se|dk|fi|pl|ch|cz|pt|jp|br|mx|za|link|page|works|tools";

function holdsEmail(text: string): boolean {
  const at = String.raw`\s*(?:@|[([{]\s*at\s*[)\]}])\s*`;
  const dot = String.raw`\s*(?:\.|[([{]\s*dot\s*[)\]}])\s*`;
  const spelled = /\b[\w.+-]+\s+at\s+[\w-]+\s+dot\s+[a-z]{2,}/i;
  return new RegExp(String.raw`[\w.+-]+${at}[\w-]+(?:${dot}[\w-]+)+`, "i").test(text) || spelled.test(text);
}

function holdsLink(text: string): boolean {
  const bare = new RegExp(String.raw`\b[a-z0-9-]{2,}(?:\.|\s?[([]?\bdot\b[)\]]?\s?)(?:${topDomain})\b`, "i");
  return /:\/\/|\bwww\b/i.test(text) || /(?:^|[\s(])@[\w.]{2,}/.test(text) || bare.test(text);
}

/** Runs of digits as people write phone numbers. Feeds, volts and sizes in a row must not look like one. */
function holdsPhone(text: string): boolean {
  const runs = text.match(/\+?\(?\d(?:[\s().\-/]{0,2}\d){6,}/g) ?? [];
  return runs.some((run) => {
    const groups = run.match(/\d+/g) ?? [];
    const sizes = groups.map((group) => group.length).join("-");
    if (run.startsWith("+") || groups.some((group) => group.length >= 7)) return true;
    if (/^(?:1-)?3-3-4$|^3-4$/.test(sizes)) return true;
    return /^\(?0\d/.test(run);
  });
}

function holdsShopName(text: string, shop: string): boolean {
  const telling = wordsOf(shop).filter((word) => word.length >= 3 && !tradeWords.has(word));
  const words = wordsOf(text);
  if (telling.some((word) => isSpelled(words, word))) return true;
  const whole = wordsOf(shop).join("");
  return whole.length >= longName && words.join("").includes(whole);
}

/** A last name in any case; a first name only with a capital, as "will", "mark" and "art" are also words. */
function holdsPerson(text: string, person: string): boolean {
  const names = wordsOf(person).filter((name) => name.length >= 2);
  const last = names.at(-1);
  if (last === undefined) return false;
  const words = wordsOf(text);
  const capitals: string[] = text.match(/(?<![\p{L}\p{N}])\p{Lu}[\p{L}\p{N}]*/gu) ?? [];
  const isCapital = (name: string) => capitals.some((word) => word.toLowerCase() === name);
  if (names.length > 1 && (last.length >= 3 ? isSpelled(words, last) : isCapital(last))) return true;
  if (names.slice(0, Math.max(1, names.length - 1)).some(isCapital)) return true;
  const whole = names.join("");
  return whole.length >= 6 && words.join("").includes(whole);
}

/** Machine names are often plain words, such as "North table": only the whole name tells, and only if more than trade words. */
function holdsMachine(text: string, machine: string): boolean {
  const name = wordsOf(machine);
  if (name.every((word) => tradeWords.has(word) || word.length < 2)) return false;
  return ` ${wordsOf(text).join(" ")} `.includes(` ${name.join(" ")} `);
}
