/** Letters of other alphabets, and Latin ones that do not decompose, by the plain Latin letter a reader takes them for. */
const lookalikes = new Map(
  Object.entries({
    ...{
      а: "a",
      в: "b",
      с: "c",
      е: "e",
      н: "h",
      һ: "h",
      і: "i",
      ј: "j",
      к: "k",
      м: "m",
      о: "o",
      р: "p",
      ѕ: "s",
      т: "t",
    },
    ...{
      у: "y",
      х: "x",
      ԁ: "d",
      ԛ: "q",
      ԝ: "w",
      α: "a",
      β: "b",
      ε: "e",
      η: "n",
      ι: "i",
      κ: "k",
      ν: "v",
      ο: "o",
      ρ: "p",
    },
    ...{ τ: "t", υ: "u", χ: "x", ı: "i", ɡ: "g", ø: "o", ł: "l", đ: "d", ð: "d", þ: "th", ß: "ss", æ: "ae", œ: "oe" },
    ...{
      А: "A",
      В: "B",
      С: "C",
      Е: "E",
      Н: "H",
      І: "I",
      Ј: "J",
      К: "K",
      М: "M",
      О: "O",
      Р: "P",
      Ѕ: "S",
      Т: "T",
      У: "Y",
    },
    ...{
      Х: "X",
      Α: "A",
      Β: "B",
      Ε: "E",
      Ζ: "Z",
      Η: "H",
      Ι: "I",
      Κ: "K",
      Μ: "M",
      Ν: "N",
      Ο: "O",
      Ρ: "P",
      Τ: "T",
      Υ: "Y",
    },
    ...{ Χ: "X", Ø: "O", Ł: "L", Đ: "D", Ð: "D", Þ: "Th", Æ: "Ae", Œ: "Oe" },
  }),
);

/** A digit of any script by its value: decimal digits of Unicode come in runs of ten, zero first. */
function plainDigit(sign: string): string {
  let before = 0;
  while (before < 60 && /^\p{Nd}$/u.test(String.fromCodePoint(sign.codePointAt(0)! - before - 1))) before++;
  return String(before % 10);
}

/** Compatibility forms and lookalikes unified, accents and invisible characters gone; case kept. */
export function plainLetters(text: string): string {
  return text
    .normalize("NFKD")
    .replace(/[\p{M}\p{Cf}\p{Default_Ignorable_Code_Point}]/gu, "")
    .replace(/\p{Nd}/gu, plainDigit)
    .replace(/\p{L}/gu, (letter) => lookalikes.get(letter) ?? letter)
    .replace(/\p{Pd}/gu, "-")
    .replace(/[。·•‧∙]/g, ".")
    .replace(/[\s\u2800]+/g, " ");
}

/** Lower-case words of a text, letters and digits alone. */
export function wordsOf(text: string): string[] {
  return (
    plainLetters(text)
      .toLowerCase()
      .match(/[\p{L}\p{N}]+/gu) ?? []
  );
}

/** From this many letters on, a name is long enough to be looked for inside words and behind digits without false alarm. */
export const longName = 5;

/** Letters by what they look like: 1, I and l alike, and the digits that stand for letters. */
function shapeOf(word: string): string {
  const shapes: Record<string, string> = { 0: "o", 1: "l", i: "l", 3: "e", 4: "a", 5: "s", 7: "t" };
  return word.replace(/[013457i]/g, (sign) => shapes[sign]!); // the class lists the keys
}

/** Whether words in a row spell a name, each a part of it: "kettle by", "k e t t l e b y". */
function isPiecedTogether(words: readonly string[], name: string, mayPart: (part: string) => boolean): boolean {
  return words.some((_, start) => {
    let spelled = "";
    for (let end = start; end < words.length && spelled.length < name.length; end++) {
      if (!mayPart(words[end]!)) return false;
      spelled += words[end]!;
      if (spelled === name && end > start) return true;
    }
    return false;
  });
}

/** Whether a name stands among lower-case words: as it is, inside a longer word, disguised with digits, or in pieces. */
export function isSpelled(words: readonly string[], name: string): boolean {
  if (words.includes(name)) return true;
  if (name.length < longName) return isPiecedTogether(words, name, (part) => part.length === 1);
  const [shapes, shape] = [words.map(shapeOf), shapeOf(name)];
  return shapes.some((word) => word.includes(shape)) || isPiecedTogether(shapes, shape, () => true);
}
