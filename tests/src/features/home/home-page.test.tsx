import { screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test, vi } from "vitest";
import type { Session } from "#shared/contracts/accounts.ts";
import { HomePage } from "../../../../src/features/home/home-page.tsx";
import { type Answers, renderPage, testOwner } from "../../../support/render-page.tsx";

const visitor: Session = { ...testOwner, user: null, shop: null };

function open(session: Session, at = "/", answers: Answers = {}) {
  const routes = [
    { path: "/", element: <HomePage withoutShop={<h1>No shop yet</h1>} /> },
    { path: "/recipes", element: <h1>Recipes</h1> },
    { path: "/members", element: <h1>Members</h1> },
  ];
  return renderPage({ routes, at, session, answers });
}

test("a visitor reads what it is, how names stay hidden and what can hurt, and may ask to join or sign in", async () => {
  open(visitor);
  const names = await screen.findByRole("region", { name: "How names stay hidden" });
  expect(names.textContent).toMatch(/Counted.*Listed.*Five shops or nothing.*What an admin sees.*What this cannot do/);
  expect(within(names).getByRole("link", { name: "The method in full" }).getAttribute("href")).toBe("/method");
  expect(screen.getByRole("link", { name: "Ask to join" }).getAttribute("href")).toBe("/join");
  expect(screen.getByRole("link", { name: "Sign in" }).getAttribute("href")).toBe("/auth/sign-in?returnTo=%2F");
  expect(screen.getByRole("link", { name: "Cautions" }).getAttribute("href")).toBe("/cautions");
});

test("the one strip says that its figures are invented", async () => {
  open(visitor);
  const example = await screen.findByRole("figure");
  expect(within(example).getByText("Example, figures invented")).toBeTruthy();
  expect(within(example).getByRole("img").getAttribute("aria-labelledby")).toBeTruthy();
  expect(screen.queryByRole("status")).toBeNull();
});

test.each([
  ["unavailable", "Signing in does not work just now"],
  ["cancelled", "You are not signed in"],
  ["expired", "You are not signed in"],
  ["failed", "Signing in failed"],
  ["unverified", "Your e-mail address is not verified"],
  ["address-in-use", "This e-mail address belongs to another account"],
  ["<b>typed by hand</b>", "Signing in failed"],
])("a sign-in that came to nothing is explained: %s", async (outcome, title) => {
  open(visitor, `/?${new URLSearchParams({ "sign-in": outcome })}`);
  const notice = await screen.findByRole("status");
  expect(within(notice).getByText(title)).toBeTruthy();
  expect(notice.textContent).not.toContain("<b>");
});

test.each([
  ["a member to the book", testOwner, "Recipes"],
  ["a member who is admin too to the book", { ...testOwner, admin: true }, "Recipes"],
  ["an admin to the members", { ...testOwner, shop: null, admin: true }, "Members"],
  ["somebody without a shop to the application", { ...testOwner, shop: null }, "No shop yet"],
])("leads %s", async (_, session, heading) => {
  open(session);
  expect(await screen.findByRole("heading", { level: 1, name: heading })).toBeTruthy();
});

test("a suspended shop reads what that means and can sign out", async () => {
  const left = vi.fn();
  vi.stubGlobal("location", { ...window.location, assign: left });
  const { sent } = open({ ...testOwner, shop: { ...testOwner.shop!, state: "suspended" } }, "/", {
    "POST /api/sign-out": { continueAt: "/after" },
  });
  expect(await screen.findByRole("heading", { name: "Brackenhold is suspended" })).toBeTruthy();
  expect(screen.queryByRole("link", { name: "Members" })).toBeNull();
  await userEvent.dblClick(screen.getByRole("button", { name: "Sign out" }));
  await vi.waitFor(() => expect(left).toHaveBeenCalledWith("/after"));
  expect(sent.filter(({ path }) => path === "/api/sign-out")).toHaveLength(1);
  vi.unstubAllGlobals();
});
