import { render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { MemoryRouter } from "react-router-dom";
import { expect, test, vi } from "vitest";
import type { Session } from "#shared/contracts/accounts.ts";
import { AppFrame } from "../../../src/shell/app-frame.tsx";
import { menuLinksFor, placesFor } from "../../../src/shell/places.ts";
import { ShopMenu } from "../../../src/shell/shop-menu.tsx";
import { SignInLink } from "../../../src/shell/sign-in-link.tsx";

const owner: Session = {
  user: { id: "0b6f0d0e-0000-4000-8000-000000000001", name: "Ode Venn", email: "ode@brackenhold.example" },
  shop: { id: "0b6f0d0e-0000-4000-8000-000000000002", name: "Brackenhold", state: "active", role: "owner" },
  admin: false,
  units: "metric",
  theme: "system",
  demo: true,
};
const admin: Session = { ...owner, shop: null, admin: true };
const visitor: Session = { ...owner, user: null, shop: null };

function renderFrame(session: Session, page = <h1>Copper 2 mm</h1>) {
  const corner = session.user ? <ShopMenu session={session} links={menuLinksFor(session)} {...acts} /> : <SignInLink />;
  return render(
    <MemoryRouter initialEntries={["/recipes/12?tab=history"]}>
      <AppFrame places={placesFor(session)} corner={corner} demo={session.demo}>
        {page}
      </AppFrame>
    </MemoryRouter>,
  );
}

const acts = { onUnits: vi.fn(), onTheme: vi.fn(), onSignOut: vi.fn() };

test("the same places stand in both bars, the present one marked", () => {
  renderFrame(owner);
  const bars = screen.getAllByRole("navigation", { name: "Places" });
  for (const bar of bars) {
    const places = within(bar).getAllByRole("link");
    expect(places.map((place) => place.textContent)).toEqual(["Recipes", "Test cuts", "Peers", "Start"]);
    expect(places.map((place) => place.getAttribute("aria-current"))).toEqual(["page", null, null, null]);
  }
  expect(bars).toHaveLength(2);
});

test.each([
  ["an admin without a shop", admin, ["Members", "Applications", "Editions"]],
  ["a visitor", visitor, []],
  ["a suspended shop", { ...owner, shop: { ...owner.shop!, state: "suspended" as const } }, []],
])("%s has other places", (_, session, labels) => {
  expect(placesFor(session).map((place) => place.label)).toEqual(labels);
});

test("an admin who cuts too finds the network in the menu", () => {
  const labels = menuLinksFor({ ...owner, admin: true }).map((link) => link.label);
  expect(labels).toEqual([
    "Machines",
    "Export the book (table)",
    "Export the book (whole)",
    "Members",
    "Applications",
    "Editions",
  ]);
});

test("the first Tab leads past the bars", async () => {
  renderFrame(owner);
  await userEvent.tab();
  expect(document.activeElement?.textContent).toBe("Skip to the page");
  expect(document.activeElement?.getAttribute("href")).toBe(`#${screen.getByRole("main").id}`);
});

test("demo data is called so, real data is not", () => {
  const { unmount } = renderFrame(owner);
  expect(screen.getByText("Demo data: every shop, person and number here is invented.")).toBeTruthy();
  unmount();
  renderFrame({ ...owner, demo: false });
  expect(screen.queryByText(/Demo data/)).toBeNull();
});

test.each([
  ["a member", owner],
  ["a visitor", visitor],
])("Method and cautions are a step away for %s", (_, session) => {
  renderFrame(session);
  const links = within(screen.getByRole("contentinfo")).getAllByRole("link");
  expect(links.map((link) => link.getAttribute("href"))).toEqual(["/method", "/cautions"]);
});

test("a visitor signs in and comes back to the same place", () => {
  renderFrame(visitor);
  const link = screen.getByRole("link", { name: "Sign in" });
  expect(link.getAttribute("href")).toBe("/auth/sign-in?returnTo=%2Frecipes%2F12%3Ftab%3Dhistory");
});

test("the menu holds units, theme, files and the way out", async () => {
  renderFrame(owner);
  await userEvent.click(screen.getByRole("button", { name: "Brackenhold · mm: menu" }));
  await userEvent.click(screen.getByRole("radio", { name: "in, psi" }));
  await userEvent.click(screen.getByRole("radio", { name: "Dark" }));
  await userEvent.click(screen.getByRole("button", { name: "Sign out" }));
  expect(acts.onUnits).toHaveBeenCalledWith("inch");
  expect(acts.onTheme).toHaveBeenCalledWith("dark");
  expect(acts.onSignOut).toHaveBeenCalledTimes(1);
  expect(screen.getByRole("link", { name: "Export the book (table)" }).hasAttribute("download")).toBe(true);
});

test("/ goes to search, n follows the new link, ? lists the keys", async () => {
  const followed = vi.fn();
  renderFrame(
    owner,
    <>
      <input aria-label="Search recipes" data-search="" />
      <button type="button" data-new="" onClick={followed}>
        New recipe
      </button>
    </>,
  );
  await userEvent.keyboard("n");
  expect(followed).toHaveBeenCalledTimes(1);
  await userEvent.keyboard("/");
  const search = screen.getByRole<HTMLInputElement>("textbox", { name: "Search recipes" });
  expect(document.activeElement).toBe(search);
  expect(search.value).toBe("");

  await userEvent.keyboard("n/?");
  expect(search.value).toBe("n/?");
  expect(followed).toHaveBeenCalledTimes(1);
  search.blur();
  await userEvent.keyboard("?");
  expect(screen.getByRole("dialog", { name: "Keys" }).textContent).toContain("Search this page");
});
