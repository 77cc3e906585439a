import { type DisclosureParameters, defaultDisclosureParameters } from "#shared/disclosure/parameters.ts";

interface Setting {
  name: string;
  words: (value: number) => string;
}

/** Every setting of the network for what may leave the server, said to a shop owner. A new one will not compile without its words. */
const settings: Record<keyof DisclosureParameters, Setting> = {
  quorum: {
    name: "Quorum",
    words: (shops) =>
      `A group, or one setpoint in it, with fewer than ${shops} shops shows nothing: no figure, and not how many shops there are.`,
  },
  tailsFrom: {
    name: "Tails",
    words: (shops) =>
      `The outer tenths, p10 and p90, and the curve on top of a strip appear from ${shops} shops on. Below that only the middle half.`,
  },
  farTailsFrom: {
    name: "Far tails",
    words: (shops) => `p5 and p95 appear from ${shops} shops on. The smallest and the largest value never do.`,
  },
  changedShops: {
    name: "Three-shop step",
    words: (shops) =>
      `A figure changes from one edition to the next only when ${shops} shops or more changed there. Otherwise the old one stays, with its date: two figures a single shop apart would give that shop away.`,
  },
  heldEditions: {
    name: "Longest hold",
    words: (editions) =>
      `What a shop takes back leaves at the next edition. Where leaving would show it, the old figure may stay ${editions} editions more; then it is withheld.`,
  },
  listingShops: {
    name: "Listed recipes",
    words: (shops) =>
      `A group shows its listed recipes only where ${shops} shops or more list there, so that none stands alone.`,
  },
  traitShops: {
    name: "Machine traits",
    words: (shops) =>
      `How the arc starts, how the air is dried and how the height is held stand beside a listed recipe only where ${shops} shops or more of the group share the trait.`,
  },
};

/** Rules without a number to set. */
const fixed = [
  ["Bands for counts", "Shops and recipes are counted as 5-9, 10-19, 20-49 or 50+, never exactly."],
  [
    "Rounding",
    "Current to 0.5 A, pressure to 0.05 bar, feed to three figures, heights and kerf to 0.05 mm, delay to 0.05 s, arc voltage to 0.5 V.",
  ],
  [
    "Editions",
    "Nothing changes between editions. Each is built at one moment, all groups together, and published whole or not at all.",
  ],
  [
    "Released figures only",
    "Your standing, starting recipes and every plot are worked out from your own values and the published edition. Trying out invented values teaches nothing about another shop.",
  ],
  [
    "Namelessness",
    "A listed recipe carries no shop, person, machine or date, only the quarter of the year, under a random number that leads nowhere. Words are shown only if the owner typed them for others; they are searched for names, addresses, phone numbers and links first.",
  ],
] as const;

export function DisclosureRules() {
  const names = Object.keys(settings) as (keyof DisclosureParameters)[]; // Object.keys forgets the key type
  return (
    <dl className="border-t border-line">
      {names.map((name) => {
        const value = defaultDisclosureParameters[name];
        return (
          <div key={name} data-setting={name} className={rowClasses}>
            <dt className="flex items-baseline justify-between gap-4 font-bold">
              {settings[name].name}
              <span className="figures text-lg font-black">{value}</span>
            </dt>
            <dd className="max-w-text text-soft">{settings[name].words(value)}</dd>
          </div>
        );
      })}
      {fixed.map(([name, text]) => (
        <div key={name} className={rowClasses}>
          <dt className="font-bold">{name}</dt>
          <dd className="max-w-text text-soft">{text}</dd>
        </div>
      ))}
    </dl>
  );
}

const rowClasses = "grid gap-x-10 gap-y-1 border-b border-line py-3 md:grid-cols-[13rem_1fr]";
