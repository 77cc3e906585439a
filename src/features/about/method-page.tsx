import { type ReactNode, useEffect } from "react";
import { useLocation } from "react-router-dom";
import { PageHeader } from "../../ui/page-header.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { DisclosureRules } from "./disclosure-rules.tsx";
import { methodSources } from "./method-sources.ts";

/** What the figures are, what protects the shops behind them, and where each method comes from. */
export function MethodPage() {
  useFragment();
  return (
    <>
      <PageHeader title="Method" facts="What the figures are, and what never leaves the server" />
      <div className="space-y-10">
        <Part id="groups" title="What is compared">
          <p>
            A peer group holds recipes for one metal, one thickness band, one nozzle and one process gas. Bands follow
            the R10 series of preferred numbers: 1, 1.25, 1.6, 2, 2.5, 3.15, 4, 5, 6.3, 8, and so on in tens. Each is
            named after its middle, so 3 mm, 1/8 in and 11 ga meet in the 3.15 band.
          </p>
          <p>
            A recipe counts when its shop shares it and an acceptable test cut belongs to the setpoints it has now: one
            for each machine in a group, the newest. Each shop weighs as one, however many machines it brings.
          </p>
        </Part>
        <Part id="figures" title="The figures">
          <p>
            p50 is the middle: half of the shops set less, half more. Between p25 and p75 lies the middle half, between
            p10 and p90 eight in ten. They are Harrell-Davis estimates, an average over neighbouring values, so no
            figure is taken from one shop. A lone value far outside is drawn in first, so that a slip of the keyboard
            cannot move a small group. Feed and kerf are worked out on a log scale, because they differ by factors.
          </p>
          <p>
            Your place among peers is read off the published figures along a smooth rising curve. "Typical" is within
            one spread of the middle, "high" or "low" within two, "unusually" beyond; the spread comes from the middle
            half. Unusual is not wrong. Where an acceptable test cut is on record, it works for you.
          </p>
        </Part>
        <Part id="starting" title="Starting recipes">
          <p>
            Where the peer group is shown, a setpoint starts from its middle value and is moved from the band to your
            exact thickness as the whole network does. Its range is set so that eight in ten further shops would fall
            inside, if shops spread as in a bell curve. Where it is not shown, a rule of thumb stands in, marked "common
            practice, no source". Where there is none either, the number stays empty and the recipe names the test that
            finds it. Then your machine's limits apply.
          </p>
          <p>
            The heat check holds the power of the arc against the power it takes to melt the kerf. It catches slips of
            unit; it does not promise a good cut. <TextLink to="/cautions">Cautions</TextLink> go with every recipe.
          </p>
        </Part>
        <section id="rules" aria-labelledby="rules-title">
          <h2 id="rules-title" className="text-xl font-black">
            What may leave the server
          </h2>
          <p className="mt-1 mb-4 max-w-text text-soft">
            The rules assume that somebody tries: a member, or two who put their own numbers together, wanting to know
            what one other shop does. The numbers are this network's settings, counted in shops or editions.
          </p>
          <DisclosureRules />
        </section>
        <section id="sources" aria-labelledby="sources-title">
          <h2 id="sources-title" className="text-xl font-black">
            Sources
          </h2>
          <ul className="mt-2 max-w-[48rem] space-y-1 text-sm text-soft">
            {methodSources.map(({ what, source }) => (
              <li key={source}>
                <b className="text-ink">{what}:</b> {source}
              </li>
            ))}
          </ul>
        </section>
      </div>
    </>
  );
}

function Part({ id, title, children }: { id: string; title: string; children: ReactNode }) {
  return (
    <section id={id} aria-labelledby={`${id}-title`}>
      <h2 id={`${id}-title`} className="text-xl font-black">
        {title}
      </h2>
      <div className="mt-1 max-w-text space-y-3 text-soft">{children}</div>
    </section>
  );
}

/** A link to one part of the page goes there; the browser cannot, since the page is not there when it looks. */
function useFragment(): void {
  const { hash } = useLocation();
  useEffect(() => {
    if (hash !== "") document.getElementById(hash.slice(1))?.scrollIntoView();
  }, [hash]);
}
