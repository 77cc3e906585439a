import { act, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { showToast } from "../../../src/ui/toast-store.ts";
import { Toasts } from "../../../src/ui/toasts.tsx";

beforeEach(() => {
  vi.useFakeTimers();
});

afterEach(() => {
  act(() => vi.runAllTimers()); // the store outlives a test
  vi.useRealTimers();
});

test("a message appears in a region that is read out politely, and goes by itself", () => {
  render(<Toasts />);
  const region = screen.getByRole("region", { name: "Messages" });
  expect(region.getAttribute("aria-live")).toBe("polite");
  act(() => showToast("Saved"));
  expect(region.textContent).toContain("Saved");
  act(() => vi.advanceTimersByTime(6000));
  expect(region.textContent).toBe("");
});

test("what can be undone stays longer, and is undone once", () => {
  const undo = vi.fn();
  render(<Toasts />);
  act(() => showToast("Recipe withdrawn", { undo }));
  act(() => vi.advanceTimersByTime(11_000));
  fireEvent.click(screen.getByRole("button", { name: "Undo" }));
  expect(undo).toHaveBeenCalledTimes(1);
  expect(screen.queryByText("Recipe withdrawn")).toBeNull();
});

test("at most three stand at once; the oldest makes room", () => {
  render(<Toasts />);
  act(() => {
    for (const text of ["one", "two", "three", "four"]) showToast(text);
  });
  expect(screen.queryByText("one")).toBeNull();
  expect(screen.getAllByRole("button", { name: "Dismiss" })).toHaveLength(3);
});

test("can be dismissed before its time", () => {
  render(<Toasts />);
  act(() => showToast("Saved"));
  fireEvent.click(screen.getByRole("button", { name: "Dismiss" }));
  expect(screen.queryByText("Saved")).toBeNull();
});
