import type { Caution } from "#shared/contracts/starting-recipe-figures.ts";
import { materialLabels, materials, processGases } from "#shared/materials/materials.ts";
import { cautionsFor } from "#shared/safety/cautions.ts";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";

interface Part {
  title: string;
  cautions: readonly Caution[];
}

/** Everything that goes with numbers to cut with, in one place. */
export function CautionsPage() {
  return (
    <>
      <PageHeader title="Cautions" facts="They go with every number to cut with, on screen, on paper and in files" />
      <Notice kind="watch" title="Plasma cutting can blind, burn, shock, poison and kill" className="mb-8">
        <p className="max-w-text">
          The numbers here report what shops do. They are no instruction. The power source maker's manual and your local
          codes come first.
        </p>
      </Notice>
      <div className="space-y-8">
        {cautionParts().map(({ title, cautions }) => (
          <section key={title} data-keep-together="">
            <h2 className="text-lg font-black">{title}</h2>
            <dl className="mt-1 border-t border-line">
              {cautions.map(({ id, title: name, text, standards }) => (
                <div key={id} className="grid gap-x-10 border-b border-line py-3 md:grid-cols-[13rem_1fr]">
                  <dt className="font-bold">{name}</dt>
                  <dd>
                    <p className="max-w-text">{text}</p>
                    {standards.length > 0 ? <p className="text-sm text-muted">{standards.join(", ")}</p> : null}
                  </dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
      </div>
    </>
  );
}

/** The cautions of every metal and gas, each said once: those that always hold, then what a metal or a gas adds. */
function cautionParts(): Part[] {
  const base = { material: "mild-steel", gas: "air", currentA: null } as const;
  const ofMetal = materials.map((material) => ({ material, all: cautionsFor({ ...base, material }) }));
  const holdsFor = (caution: Caution) => ofMetal.filter(({ all }) => all.some(({ text }) => text === caution.text));
  const always = ofMetal[0]!.all.filter((caution) => holdsFor(caution).length === materials.length);
  const added = (cautions: readonly Caution[]) => cautions.filter(({ text }) => !always.some((a) => a.text === text));
  const ofGases = processGases.flatMap((gas) =>
    added(cautionsFor({ ...base, gas })).filter(({ id }) => id !== "fumes"),
  );
  return [
    { title: "Always", cautions: always },
    ...ofMetal.map(({ material, all }) => ({ title: materialLabels[material], cautions: added(all) })),
    { title: "Other gases than air", cautions: ofGases },
  ];
}
