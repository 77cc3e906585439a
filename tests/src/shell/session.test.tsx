import { useSuspenseQuery } from "@tanstack/react-query";
import { screen } from "@testing-library/react";
import { Outlet } from "react-router-dom";
import { afterEach, expect, test, vi } from "vitest";
import { getCurrentEdition } from "#shared/contracts/editions.ts";
import { call } from "../../../src/lib/api.ts";
import { keepDraft, readDraft } from "../../../src/lib/draft.ts";
import { sessionKey } from "../../../src/lib/query-client.ts";
import { ProblemPage } from "../../../src/shell/problem-page.tsx";
import { useSession } from "../../../src/shell/session.queries.ts";
import { Refusal, renderPage, testOwner } from "../../support/render-page.tsx";

afterEach(() => sessionStorage.clear());

const edition = { id: "0b6f0d0e-0000-4000-8000-000000000009", number: 7, date: "2026-03-04" };

function Frame() {
  return (
    <>
      <p>{useSession().user?.name ?? "Nobody"}</p>
      <Outlet />
    </>
  );
}

function Figures() {
  const { data } = useSuspenseQuery({
    queryKey: ["figures"],
    queryFn: () => call(getCurrentEdition, {}),
    staleTime: Number.POSITIVE_INFINITY,
  });
  return <p>Edition {data.edition?.number}</p>;
}

function renderFigures(answers: Record<string, unknown>) {
  const routes = [
    { element: <Frame />, children: [{ path: "/", element: <Figures />, errorElement: <ProblemPage /> }] },
  ];
  return renderPage({ routes, at: "/", answers });
}

test("what was read stays while the session says the same", async () => {
  const { queries, sent } = renderFigures({ "GET /api/session": testOwner, "GET /api/editions/current": { edition } });
  await screen.findByText("Edition 7");
  await queries.invalidateQueries({ queryKey: sessionKey });
  screen.getByText("Edition 7");
  expect(sent.filter(({ path }) => path === "/api/editions/current")).toHaveLength(1);
});

test("a shop suspended meanwhile loses sight of figures that were to be kept for good", async () => {
  const answers: Record<string, unknown> = { "GET /api/editions/current": { edition } };
  const { queries } = renderFigures(answers);
  await screen.findByText("Edition 7");
  answers["GET /api/session"] = { ...testOwner, shop: { ...testOwner.shop, state: "suspended" } };
  answers["GET /api/editions/current"] = new Refusal("shop-suspended");
  await queries.invalidateQueries({ queryKey: sessionKey });
  await screen.findByText("Your shop is suspended");
  expect(screen.queryByText("Edition 7")).toBeNull();
  vi.mocked(console.error).mockClear(); // React names the refusal it hands to the problem page
});

test("a refusal that ends the session is noticed by the page that meets it", async () => {
  renderFigures({
    "GET /api/session": { ...testOwner, user: null, shop: null },
    "GET /api/editions/current": new Refusal("not-signed-in"),
  });
  await screen.findByText("Sign in first");
  await screen.findByText("Nobody");
  vi.mocked(console.error).mockClear();
});

test("drafts wait for the one who wrote them, and for nobody else", async () => {
  const answers: Record<string, unknown> = { "GET /api/session": testOwner, "GET /api/editions/current": { edition } };
  const { queries } = renderFigures(answers);
  await queries.refetchQueries({ queryKey: sessionKey });
  keepDraft("recipe:new", { note: "leaks at the regulator" });
  await queries.refetchQueries({ queryKey: sessionKey });
  expect(readDraft("recipe:new")).toBeDefined();
  answers["GET /api/session"] = {
    ...testOwner,
    user: { ...testOwner.user, id: "0b6f0d0e-0000-4000-8000-00000000000a" },
  };
  await queries.refetchQueries({ queryKey: sessionKey });
  expect(readDraft("recipe:new")).toBeUndefined();
});
