import { fireEvent, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { expect, test, vi } from "vitest";
import { ConfirmDialog } from "../../../src/ui/confirm-dialog.tsx";
import { Dialog } from "../../../src/ui/dialog.tsx";

function Opener() {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button type="button" onClick={() => setOpen(true)}>
        Show
      </button>
      <Dialog open={open} onClose={() => setOpen(false)} title="What others see">
        <p>Numbers, no name</p>
      </Dialog>
    </>
  );
}

test("opens as a modal named by its title, and gives focus back on closing", async () => {
  const showModal = vi.spyOn(HTMLDialogElement.prototype, "showModal");
  render(<Opener />);
  const opener = screen.getByRole("button", { name: "Show" });
  await userEvent.click(opener);
  expect(showModal).toHaveBeenCalledTimes(1);
  expect(screen.getByRole("dialog", { name: "What others see" })).toBeTruthy();

  await userEvent.click(screen.getByRole("button", { name: "Close" }));
  expect(screen.queryByRole("dialog")).toBeNull();
  expect(document.activeElement).toBe(opener);
  showModal.mockRestore();
});

test("closes on Escape, which the browser reports as cancel", async () => {
  render(<Opener />);
  await userEvent.click(screen.getByRole("button", { name: "Show" }));
  fireEvent(screen.getByRole("dialog"), new Event("cancel", { cancelable: true }));
  expect(screen.queryByRole("dialog")).toBeNull();
});

test("closes on a press beside it, not on one inside it", async () => {
  render(<Opener />);
  await userEvent.click(screen.getByRole("button", { name: "Show" }));
  await userEvent.click(screen.getByText("Numbers, no name"));
  expect(screen.queryByRole("dialog")).not.toBeNull();
  await userEvent.click(screen.getByRole("dialog"));
  expect(screen.queryByRole("dialog")).toBeNull();
});

const lost = { title: "Delete Copper 2 mm?", act: "Delete recipe", children: <p>Its 14 test cuts go too.</p> };

test("a destructive act waits until the name is typed", async () => {
  const confirmed = vi.fn();
  render(<ConfirmDialog {...lost} open onClose={() => {}} onConfirm={confirmed} typeName="Copper 2 mm" />);
  const name = screen.getByRole("textbox", { name: "Type Copper 2 mm to confirm" });
  await userEvent.type(name, "copper{Enter}");
  expect(confirmed).not.toHaveBeenCalled();
  expect(screen.getByText("This does not match. Type Copper 2 mm")).toBeTruthy();

  await userEvent.clear(name);
  await userEvent.type(name, " Copper 2 mm ");
  await userEvent.click(screen.getByRole("button", { name: "Delete recipe" }));
  expect(confirmed).toHaveBeenCalledTimes(1);
});

test("an act that can be undone asks without a name", async () => {
  const confirmed = vi.fn();
  render(<ConfirmDialog {...lost} open onClose={() => {}} onConfirm={confirmed} />);
  expect(screen.queryByRole("textbox")).toBeNull();
  await userEvent.click(screen.getByRole("button", { name: "Delete recipe" }));
  expect(confirmed).toHaveBeenCalledTimes(1);
});

test("leaves everything as it is on the way out, and while the act is under way", async () => {
  const confirmed = vi.fn();
  const closed = vi.fn();
  render(<ConfirmDialog {...lost} open onClose={closed} onConfirm={confirmed} pending />);
  await userEvent.click(screen.getByRole("button", { name: "Delete recipe" }));
  await userEvent.click(screen.getByRole("button", { name: "Keep as it is" }));
  expect(confirmed).not.toHaveBeenCalled();
  expect(closed).toHaveBeenCalledTimes(1);
});
