import { Button } from "../ui/button.tsx";
import { Notice } from "../ui/notice.tsx";
import { linkClasses } from "../ui/text-link.tsx";
import type { ApiProblem } from "./api-problem.ts";
import { signInHref } from "./sign-in-href.ts";

/** Why a form was not taken, where no single field is to blame. What was typed stays. */
export function FormProblem({ problem }: { problem: ApiProblem | undefined }) {
  if (!problem) return null;
  if (problem.kind === "not-signed-in") return <SessionEnded />;
  return (
    <Notice kind="stop" live title={problem.message}>
      {problem.detail ? <p>{problem.detail}</p> : null}
      {problem.errors.map((error) => (
        <p key={error.pointer}>{error.detail}</p>
      ))}
      {problem.passing ? <p>Nothing was lost: what you typed is still here. Send it again in a moment.</p> : null}
      {problem.requestId && problem.status >= 500 ? (
        <p className="text-sm text-soft">Request {problem.requestId}</p>
      ) : null}
    </Notice>
  );
}

function SessionEnded() {
  const here = window.location.pathname + window.location.search;
  return (
    <Notice kind="watch" live title="Your session has ended">
      <p>
        <a href={signInHref(here)} className={linkClasses}>
          Sign in again
        </a>
        . What you typed is kept and will be here when you come back.
      </p>
    </Notice>
  );
}

/** Says that the fields hold an earlier draft, and offers to begin anew. */
export function DraftNotice({ restored, onStartOver }: { restored: boolean; onStartOver: () => void }) {
  if (!restored) return null;
  return (
    <Notice title="This is what you typed before and did not save">
      <Button kind="quiet" small className="-ml-3" onClick={onStartOver}>
        Start over
      </Button>
    </Notice>
  );
}
