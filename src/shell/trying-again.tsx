import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useState } from "react";
import { useLocation, useNavigate } from "react-router-dom";
import { getSession } from "#shared/contracts/accounts.ts";
import { call } from "../lib/api.ts";
import { ApiProblem } from "../lib/api-problem.ts";
import { PageHeader } from "../ui/page-header.tsx";

/** Seconds before each attempt; the last one is repeated for as long as it takes. */
const waitsS = [1, 2, 4, 8, 15];

/** Stands in for a page while the server or its database is away, and brings the page back by itself. */
export function TryingAgain({ problem }: { problem: ApiProblem }) {
  const queries = useQueryClient();
  const navigate = useNavigate();
  const location = useLocation();
  const [attempt, setAttempt] = useState(0);

  useEffect(() => {
    const stopped = new AbortController();
    const waitS = waitsS[Math.min(attempt, waitsS.length - 1)]!;
    const timer = setTimeout(async () => {
      const answers = await answersAgain(stopped.signal);
      if (stopped.signal.aborted) return;
      if (answers) {
        queries.removeQueries({ predicate: (query) => query.state.status === "error" });
        // The route gives up its error only when the location is new; the address stays as it is.
        await navigate(location, { replace: true, state: location.state, preventScrollReset: true });
      }
      // Counts on even after a good answer: the page's own request may be what still fails.
      setAttempt((count) => count + 1);
    }, waitS * 1000);
    return () => {
      clearTimeout(timer);
      stopped.abort();
    };
  }, [attempt, queries, navigate, location]);

  return (
    <section className="max-w-text" role="status">
      <PageHeader title={headingOf(problem)} />
      <p>Trying again… This page comes back by itself. Nothing you saved is lost.</p>
      {problem.requestId ? <p className="mt-2 text-sm text-muted">Request {problem.requestId}</p> : null}
    </section>
  );
}

function headingOf({ kind, message }: ApiProblem): string {
  if (kind === "unreachable" || kind === "unreadable") return "The server does not answer.";
  return message.endsWith(".") ? message : `${message}.`;
}

/** Any refusal that is not a passing one is an answer too. */
async function answersAgain(signal: AbortSignal): Promise<boolean> {
  try {
    await call(getSession, {}, signal);
    return true;
  } catch (error) {
    return error instanceof ApiProblem && !error.passing;
  }
}
