import { isRouteErrorResponse, Link, useLocation, useRouteError } from "react-router-dom";
import { ApiProblem } from "../lib/api-problem.ts";
import { signInHref } from "../lib/sign-in-href.ts";
import { buttonClasses } from "../ui/button.tsx";
import { PageHeader } from "../ui/page-header.tsx";
import { TryingAgain } from "./trying-again.tsx";

/** The errorElement of every route: what happened, and what to do next. */
export function ProblemPage() {
  const error = useRouteError();
  return <ProblemView problem={problemOf(error)} />;
}

/** The last route: an address that leads nowhere. */
export function NotFoundPage() {
  return <ProblemView problem={nothingHere} />;
}

const nothingHere = new ApiProblem("not-found", { title: "There is nothing here", status: 404 });

function problemOf(error: unknown): ApiProblem {
  if (error instanceof ApiProblem) return error;
  if (isRouteErrorResponse(error) && error.status === 404) return nothingHere;
  console.error(error);
  return new ApiProblem("internal", {
    title: "Something failed on this page",
    status: 500,
    detail: "Reload it. If it fails again, tell the network's admin what you were doing.",
  });
}

const advice: Partial<Record<ApiProblem["kind"], string>> = {
  "not-found": "The address may be mistyped, or what was here has been removed.",
  "not-allowed": "Ask the owner of your shop if you need this.",
  "shop-suspended": "Nobody in the shop can work in the network until an admin lifts it.",
  "too-many-requests": "Wait a minute, then reload.",
};

function ProblemView({ problem }: { problem: ApiProblem }) {
  const { pathname, search } = useLocation();
  if (problem.passing) return <TryingAgain problem={problem} />;
  return (
    <section className="max-w-text">
      <PageHeader title={problem.message} />
      <p>{problem.detail ?? advice[problem.kind]}</p>
      {problem.requestId ? <p className="mt-2 text-sm text-muted">Request {problem.requestId}</p> : null}
      <p className="mt-6">
        {problem.kind === "not-signed-in" ? (
          <a href={signInHref(pathname + search)} className={buttonClasses("primary")}>
            Sign in
          </a>
        ) : (
          <Link to="/" className={buttonClasses("secondary")}>
            To the first page
          </Link>
        )}
      </p>
    </section>
  );
}
