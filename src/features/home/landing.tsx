import { TriangleAlert } from "lucide-react";
import { useEffect } from "react";
import { signInHref } from "../../lib/sign-in-href.ts";
import { ButtonLink, buttonClasses } from "../../ui/button.tsx";
import { TextLink } from "../../ui/text-link.tsx";
import { ExampleStrip } from "./example-strip.tsx";
import { HiddenNames } from "./hidden-names.tsx";
import { SignInNotice } from "./sign-in-notice.tsx";

const uses = [
  [
    "Keep",
    "Your recipes by metal, thickness and nozzle, with every change and every test cut. Nobody else sees the book.",
  ],
  ["Share", "The proven ones, without your name: into the figures only, or shown as well."],
  ["Compare", "Each setpoint among the shops that cut the same. What is unusual, and what to check first."],
  [
    "Start",
    "On a metal you have never cut: a starting recipe for your own machine, with ranges and a short plan of test cuts.",
  ],
] as const;

/** All a visitor needs to decide, on one page. */
export function Landing({ signIn }: { signIn: string | null }) {
  useEffect(() => {
    document.title = "Tempermark · cut settings among small plasma shops";
  }, []);
  return (
    <div className="mx-auto max-w-page">
      <SignInNotice outcome={signIn} />
      <div className="grid items-end gap-x-14 gap-y-8 lg:grid-cols-[1fr_30rem]">
        <div>
          <h1 className="max-w-text text-2xl font-black tracking-[-0.01em] md:text-[2.5rem] md:leading-[3rem]">
            Is your feed rate odd, or does everyone cut at it?
          </h1>
          <p className="mt-4 max-w-text text-lg text-soft">
            A members' network for small shops that cut sheet and plate on a CNC plasma table. It shows where your
            numbers sit among theirs. It does not show whose are whose.
          </p>
          <p className="mt-6 flex flex-wrap gap-3">
            <ButtonLink to="/join" kind="primary">
              Ask to join
            </ButtonLink>
            <a href={signInHref("/")} className={buttonClasses("secondary")}>
              Sign in
            </a>
          </p>
        </div>
        <dl className="border-t border-line">
          {uses.map(([name, text]) => (
            <div key={name} className="grid grid-cols-[5.5rem_1fr] border-b border-line py-2.5">
              <dt className="font-bold">{name}</dt>
              <dd className="text-soft">{text}</dd>
            </div>
          ))}
        </dl>
      </div>
      <div className="mt-10">
        <ExampleStrip />
      </div>
      <HiddenNames />
      <Cautions />
    </div>
  );
}

function Cautions() {
  return (
    <p className="mt-12 flex max-w-text gap-2 text-soft">
      <TriangleAlert aria-hidden="true" size={18} className="mt-0.5 shrink-0 text-watch" />
      <span>
        Plasma cutting can blind, burn, shock, poison and kill. The figures here are reports of what other shops do, not
        instructions; the power source maker's manual comes first. <TextLink to="/cautions">Cautions</TextLink>
      </span>
    </p>
  );
}
