import { act, render } from "@testing-library/react";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { expect, test } from "vitest";
import { useUrlState } from "../../../src/lib/use-url-state.ts";

const defaults = { q: "", sort: "name" };
type Kept = ReturnType<typeof useUrlState<typeof defaults>>;
let kept: Kept;

function Reader() {
  kept = useUrlState(defaults);
  return null;
}

function open(address: string) {
  const router = createMemoryRouter([{ path: "*", element: <Reader /> }], { initialEntries: [address] });
  render(<RouterProvider router={router} />);
  return router;
}

test("reads the address, with defaults for what it does not say", () => {
  open("/recipes?q=copper&cursor=abc&unknown=1");
  expect(kept[0]).toEqual({ q: "copper", sort: "name", cursor: "abc" });
});

test("writes only what differs, and goes back to the first page", async () => {
  const router = open("/recipes?q=copper&cursor=abc&tab=all");
  await act(async () => kept[1]({ sort: "feed" }));
  expect(router.state.location.search).toBe("?q=copper&tab=all&sort=feed");
  await act(async () => kept[1]({ q: "", sort: "name" }));
  expect(router.state.location.search).toBe("?tab=all");
});

test("typing does not fill the history; a step asked for does", async () => {
  const router = open("/recipes");
  await act(async () => kept[1]({ q: "c" }));
  expect(router.state.historyAction).toBe("REPLACE");
  await act(async () => kept[1]({ sort: "feed" }, { replace: false }));
  expect(router.state.historyAction).toBe("PUSH");
});
