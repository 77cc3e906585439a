import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { createMemoryRouter, MemoryRouter, RouterProvider, useSearchParams } from "react-router-dom";
import { expect, test, vi } from "vitest";
import { EmptyState } from "../../../src/ui/empty-state.tsx";
import { Menu } from "../../../src/ui/menu.tsx";
import { Notice, StateWord } from "../../../src/ui/notice.tsx";
import { PageHeader } from "../../../src/ui/page-header.tsx";
import { Pagination } from "../../../src/ui/pagination.tsx";
import { Progress } from "../../../src/ui/progress.tsx";
import { Segmented } from "../../../src/ui/segmented.tsx";
import { Skeleton } from "../../../src/ui/skeleton.tsx";

test("a page header is the page's one heading, names the tab and leads back", () => {
  render(
    <MemoryRouter>
      <PageHeader title="Copper 2 mm" facts="0.8 mm nozzle" back={{ to: "/recipes", label: "Recipes" }} />
    </MemoryRouter>,
  );
  expect(screen.getByRole("heading", { level: 1, name: "Copper 2 mm" })).toBeTruthy();
  expect(document.title).toBe("Copper 2 mm · Tempermark");
  expect(screen.getByRole("link", { name: "Recipes" }).getAttribute("href")).toBe("/recipes");
});

test("a notice says its kind in words where no better title is given", () => {
  render(<Notice kind="watch">The feed is high.</Notice>);
  expect(screen.getByText("Watch")).toBeTruthy();
});

test.each([
  ["stop", "alert"],
  ["watch", "status"],
] as const)("a live %s notice is announced as %s", (kind, role) => {
  render(
    <Notice kind={kind} live title="Not saved">
      Try again.
    </Notice>,
  );
  expect(screen.getByRole(role).textContent).toBe("Not savedTry again.");
});

test("a state is a word, its icon only decoration", () => {
  const { container } = render(<StateWord kind="sound">Proven</StateWord>);
  expect(container.textContent).toBe("Proven");
  expect(container.querySelector("svg")?.getAttribute("aria-hidden")).toBe("true");
});

test("an empty place has a heading and its first step", () => {
  render(
    <EmptyState title="No test cuts yet" action={<button type="button">Log a test cut</button>}>
      Cut a coupon.
    </EmptyState>,
  );
  expect(screen.getByRole("heading", { name: "No test cuts yet" })).toBeTruthy();
  expect(screen.getByRole("button", { name: "Log a test cut" })).toBeTruthy();
});

test("progress reports its share and words, or that its end is unknown", () => {
  const { rerender } = render(<Progress label="Building the edition" value={0.3} text="12 of 40 groups" />);
  const bar = screen.getByRole("progressbar", { name: "Building the edition" });
  expect(bar.getAttribute("aria-valuenow")).toBe("30");
  expect(bar.getAttribute("aria-valuetext")).toBe("12 of 40 groups");
  rerender(<Progress label="Building the edition" />);
  expect(bar.getAttribute("aria-valuenow")).toBeNull();
  expect(screen.getByText("Working…")).toBeTruthy();
});

test("a skeleton tells a screen reader that something is loading", () => {
  render(<Skeleton lines={2} />);
  expect(screen.getByRole("status", { name: "Loading" }).children).toHaveLength(2);
});

const nextOf = new Map<string | null, string>([
  [null, "b"],
  ["b", "c"],
]);

function ListOfThreePages() {
  const [params] = useSearchParams();
  return <Pagination next={nextOf.get(params.get("cursor")) ?? null} />;
}

test("pages lead onward by cursor and back the same way, keeping the filters", async () => {
  const router = createMemoryRouter([{ path: "*", element: <ListOfThreePages /> }], {
    initialEntries: ["/audit?q=copper"],
  });
  render(<RouterProvider router={router} />);
  const search = () => router.state.location.search;
  expect(screen.queryByRole("link", { name: "Newer" })).toBeNull();
  await userEvent.click(screen.getByRole("link", { name: "Older" }));
  expect(search()).toBe("?q=copper&cursor=b");
  await userEvent.click(screen.getByRole("link", { name: "Older" }));
  expect(search()).toBe("?q=copper&cursor=c");
  expect(screen.queryByRole("link", { name: "Older" })).toBeNull();
  await userEvent.click(screen.getByRole("link", { name: "Newer" }));
  expect(search()).toBe("?q=copper&cursor=b");
  await userEvent.click(screen.getByRole("link", { name: "Newer" }));
  expect(search()).toBe("?q=copper");
});

test("a page opened by its address leads back to the first", async () => {
  const router = createMemoryRouter([{ path: "*", element: <Pagination next="d" /> }], {
    initialEntries: ["/audit?cursor=c"],
  });
  render(<RouterProvider router={router} />);
  await userEvent.click(screen.getByRole("link", { name: "Newer" }));
  expect(router.state.location.search).toBe("");
});

test("a list on one page shows no pages", () => {
  render(
    <MemoryRouter>
      <Pagination next={null} />
    </MemoryRouter>,
  );
  expect(screen.queryByRole("navigation")).toBeNull();
});

test("a menu opens on its button and closes on Escape, on a press elsewhere and when left by Tab", async () => {
  render(
    <>
      <Menu label="Brackenhold">{() => <a href="/machines">Machines</a>}</Menu>
      <button type="button">Elsewhere</button>
    </>,
  );
  const button = screen.getByRole("button", { name: "Brackenhold" });
  const open = () => screen.queryByRole("link", { name: "Machines" }) !== null;
  await userEvent.click(button);
  expect(open()).toBe(true);
  expect(button.getAttribute("aria-expanded")).toBe("true");
  await userEvent.keyboard("{Escape}");
  expect(open()).toBe(false);
  expect(document.activeElement).toBe(button);

  await userEvent.keyboard("{Enter}");
  await userEvent.click(document.body);
  expect(open()).toBe(false);

  await userEvent.click(button);
  await userEvent.tab();
  expect(open()).toBe(true);
  await userEvent.tab();
  expect(open()).toBe(false);
});

test("a segmented choice is a named group of radios", async () => {
  const changed = vi.fn();
  const choices = [
    { value: "metric", label: "mm, bar" },
    { value: "inch", label: "in, psi" },
  ] as const;
  render(<Segmented label="Units" choices={choices} value="metric" onChange={changed} />);
  expect(screen.getByRole("group", { name: "Units" })).toBeTruthy();
  expect(screen.getByRole<HTMLInputElement>("radio", { name: "mm, bar" }).checked).toBe(true);
  await userEvent.click(screen.getByRole("radio", { name: "in, psi" }));
  expect(changed).toHaveBeenCalledWith("inch");
});
