import { useSuspenseQuery } from "@tanstack/react-query";
import { useNavigate } from "react-router-dom";
import { formatDate } from "#shared/units/dates.ts";
import { useSession } from "../../shell/session.queries.ts";
import { buttonClasses } from "../../ui/button.tsx";
import { Notice } from "../../ui/notice.tsx";
import { PageHeader } from "../../ui/page-header.tsx";
import { ApplicationForm } from "./application-form.tsx";
import { ownApplicationQuery } from "./applications.queries.ts";
import { NextSteps } from "./next-steps.tsx";

/** The first page of somebody who belongs to no shop: what became of their application, or the way to send one. */
export function OwnApplication() {
  const { application } = useSuspenseQuery(ownApplicationQuery).data;
  if (!application) {
    return (
      <>
        <PageHeader title="Ask to join" facts="You are signed in, and belong to no shop yet" />
        <Address />
        <Apply />
      </>
    );
  }
  const sent = `${application.shopName}, sent ${formatDate(application.createdAt)}`;
  if (application.state === "waiting") {
    return (
      <>
        <PageHeader title="Your application waits" facts={sent} />
        <p className="mb-4 max-w-text">No admin has decided on it yet. Nothing is needed from you.</p>
        <NextSteps />
      </>
    );
  }
  if (application.state === "admitted") {
    return (
      <>
        <PageHeader title={`${application.shopName} is admitted`} facts={sent} />
        <p className="mb-4 max-w-text">You own it from now on. First describe the machine, then its recipes.</p>
        {/* A page load, not a route: the session is asked for anew, and with it the shop. */}
        <a href="/" className={buttonClasses("primary")}>
          Open the shop
        </a>
      </>
    );
  }
  return (
    <>
      <PageHeader title="Your application was declined" facts={sent} />
      <Notice kind="watch" title="The reason given" className="mb-8 max-w-lg">
        <p className="whitespace-pre-line break-words">{application.reason}</p>
      </Notice>
      <h2 className="mb-4 text-lg font-bold">Ask again</h2>
      <Apply />
    </>
  );
}

function Apply() {
  const { user } = useSession();
  const navigate = useNavigate();
  return <ApplicationForm known={user} onSent={() => navigate("/join/received")} />;
}

function Address() {
  const { user } = useSession();
  return (
    <p className="mb-6 max-w-lg break-words text-soft">
      No application is known from <b>{user?.email}</b>. If you sent one from another address, sign out and in again
      with that one.
    </p>
  );
}
