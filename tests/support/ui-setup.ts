import { cleanup, configure } from "@testing-library/react";
import { afterEach, beforeEach, expect, type MockInstance, vi } from "vitest";

/** jsdom measures nothing, so nothing ever changes size. */
class SilentResizeObserver implements ResizeObserver {
  observe(): void {}
  unobserve(): void {}
  disconnect(): void {}
}
globalThis.ResizeObserver ??= SilentResizeObserver;

/** jsdom knows the dialog element but not how to open and close it; only what tests can see is done here. */
function openDialog(this: HTMLDialogElement): void {
  if (this.open) throw new DOMException("the dialog is already open", "InvalidStateError");
  this.open = true;
}

function closeDialog(this: HTMLDialogElement, value?: string): void {
  if (!this.open) return;
  this.open = false;
  if (value !== undefined) this.returnValue = value;
  this.dispatchEvent(new Event("close"));
}

HTMLDialogElement.prototype.show ??= openDialog;
HTMLDialogElement.prototype.showModal ??= openDialog;
HTMLDialogElement.prototype.close ??= closeDialog;

// A busy machine takes long to show what comes from a request, and the first chart to be compiled.
configure({ asyncUtilTimeout: 15_000 });

/** React asks the browser about every tag; jsdom does not know this one yet. */
const jsdomLacksSearch = (words: unknown[]) => String(words[0]).includes("is unrecognized") && words[1] === "search";

let consoleError: MockInstance<typeof console.error>;

beforeEach(() => {
  consoleError = vi.spyOn(console, "error").mockImplementation(() => {});
});

/** A test that expects an error on the console takes it with `vi.mocked(console.error).mockClear()` after looking at it. */
afterEach(() => {
  cleanup();
  const complaints = consoleError.mock.calls
    .filter((words) => !jsdomLacksSearch(words))
    .map((words) => words.map(String).join(" "));
  consoleError.mockRestore();
  expect(complaints, "nothing unexpected on console.error").toEqual([]);
});
