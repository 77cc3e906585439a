import { TextLink } from "../../ui/text-link.tsx";

const levels = [
  ["Private", "Stays in your book. Where every recipe begins."],
  ["Counted", "Mixed into the figures of its group. No number of it is shown by itself."],
  [
    "Listed",
    "Also shown, nameless: rounded setpoints, metal, thickness, nozzle and the quarter of the year. No words but those you write for others.",
  ],
] as const;

const rules = [
  ["Five shops or nothing", "With fewer, a group shows no figure, and not how many are missing."],
  [
    "No single shop in a figure",
    "Every shop weighs the same. Never the smallest or the largest value; the outer tenths only from ten shops on. How many shops stand behind it is said in bands: 5 to 9, 10 to 19, 20 to 49, 50 or more.",
  ],
  [
    "Nothing moves in between",
    "Figures change with dated editions, and in a group only when three shops or more have changed. So nobody can watch one shop arrive.",
  ],
  [
    "What an admin sees",
    "Your shop's name and place, what you wrote in the application, and how many people, machines and shared recipes it has. No page shows an admin which recipe is whose.",
  ],
  [
    "What this cannot do",
    "Whoever looks after the server's database could look into it. And someone who knows your numbers by heart may know them again: keep such a recipe counted, not listed.",
  ],
] as const;

/** The promise to a member who fears being recognised, with its limits. */
export function HiddenNames() {
  return (
    <section aria-labelledby="names" className="mt-14">
      <h2 id="names" className="text-xl font-black">
        How names stay hidden
      </h2>
      <p className="mt-1 mb-5 max-w-text text-soft">
        You choose for each recipe, see beforehand exactly what others will see, and can withdraw it.
      </p>
      <dl className="grid border-t border-line md:grid-cols-3 md:border-b">
        {levels.map(([name, text]) => (
          <div
            key={name}
            className="py-4 max-md:border-b max-md:border-line md:border-l md:border-line md:px-6 md:first:border-l-0 md:first:pl-0"
          >
            <dt className="text-lg font-bold">{name}</dt>
            <dd className="mt-1 text-soft">{text}</dd>
          </div>
        ))}
      </dl>
      <dl className="mt-6">
        {rules.map(([name, text]) => (
          <div key={name} className="grid gap-x-8 border-b border-line py-3 md:grid-cols-[14rem_1fr]">
            <dt className="font-bold">{name}</dt>
            <dd className="max-w-text text-soft">{text}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-4">
        <TextLink to="/method">The method in full</TextLink>
      </p>
    </section>
  );
}
