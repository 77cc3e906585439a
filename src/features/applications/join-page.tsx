import { useNavigate } from "react-router-dom";
import { signInHref } from "../../lib/sign-in-href.ts";
import { useSession } from "../../shell/session.queries.ts";
import { ButtonLink, buttonClasses } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { linkClasses } from "../../ui/text-link.tsx";
import { ApplicationForm } from "./application-form.tsx";
import { NextSteps } from "./next-steps.tsx";

const back = { to: "/", label: "First page" };

export function JoinPage() {
  const { user, shop } = useSession();
  const navigate = useNavigate();
  return (
    <>
      <PageHeader title="Ask to join" facts="For shops that cut on a CNC plasma table" back={back} />
      {shop ? (
        <Notice title={`${shop.name} is a member already`} className="mb-6 max-w-lg">
          Send this only for another shop, with an e-mail address that belongs to no member.
        </Notice>
      ) : null}
      <div className="grid gap-x-14 gap-y-10 lg:grid-cols-[32rem_1fr]">
        <ApplicationForm known={shop ? null : user} onSent={() => navigate("/join/received")} />
        <aside aria-labelledby="next" className="max-w-text max-lg:border-t max-lg:border-line max-lg:pt-6">
          <h2 id="next" className="mb-3 text-lg font-bold">
            What happens next
          </h2>
          <NextSteps />
          {user ? null : (
            <p className="mt-6 text-soft">
              Asked before, or admitted already?{" "}
              <a href={signInHref("/")} className={linkClasses}>
                Sign in
              </a>{" "}
              to see where it stands.
            </p>
          )}
        </aside>
      </div>
    </>
  );
}

/** Where the form leads: a page to come back to, since no e-mail follows. */
export function JoinReceivedPage() {
  const { user } = useSession();
  return (
    <>
      <PageHeader title="Your application is in" facts="Nothing more is needed from you now" />
      <NextSteps />
      <p className="mt-6 max-w-text text-soft">
        An application waits from each e-mail address at most once: if one of yours was waiting, that one stands.
      </p>
      <p className="mt-6">
        {user ? (
          <ButtonLink to="/" kind="primary">
            See where it stands
          </ButtonLink>
        ) : (
          <a href={signInHref("/")} className={buttonClasses("secondary")}>
            Sign in to see where it stands
          </a>
        )}
      </p>
    </>
  );
}
