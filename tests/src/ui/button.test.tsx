import { act, render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { MemoryRouter } from "react-router-dom";
import { expect, test, vi } from "vitest";
import { Button, ButtonLink } from "../../../src/ui/button.tsx";

test("does not submit a form unless asked to", async () => {
  const submitted = vi.fn((event: React.FormEvent) => event.preventDefault());
  render(
    <form onSubmit={submitted}>
      <Button>Add a row</Button>
      <Button type="submit">Save</Button>
    </form>,
  );
  await userEvent.click(screen.getByRole("button", { name: "Add a row" }));
  expect(submitted).not.toHaveBeenCalled();
  await userEvent.click(screen.getByRole("button", { name: "Save" }));
  expect(submitted).toHaveBeenCalledTimes(1);
});

test("a pending button keeps its focus and submits nothing", async () => {
  const submitted = vi.fn((event: React.FormEvent) => event.preventDefault());
  render(
    <form onSubmit={submitted}>
      <Button type="submit" pending>
        Save
      </Button>
    </form>,
  );
  const button = screen.getByRole("button", { name: "Save" });
  await userEvent.click(button);
  await userEvent.keyboard("{Enter}");
  expect(submitted).not.toHaveBeenCalled();
  expect(button).toHaveProperty("ariaDisabled", "true");
  expect(document.activeElement).toBe(button);
});

test("an act under way is not begun a second time", async () => {
  let finish = () => {};
  const send = vi.fn(() => new Promise<void>((resolve) => (finish = resolve)));
  render(<Button onClick={send}>Withdraw</Button>);
  const button = screen.getByRole("button");
  await userEvent.dblClick(button);
  expect(send).toHaveBeenCalledTimes(1);
  expect(button.getAttribute("aria-busy")).toBe("true");

  await act(async () => finish());
  await userEvent.click(button);
  expect(send).toHaveBeenCalledTimes(2);
});

test("can be used again after an act that failed", async () => {
  const send = vi.fn(() => Promise.reject(new Error("refused")));
  render(<Button onClick={send}>Withdraw</Button>);
  await userEvent.click(screen.getByRole("button"));
  await userEvent.click(screen.getByRole("button"));
  expect(send).toHaveBeenCalledTimes(2);
});

test("a link that looks like a button is still a link", () => {
  render(
    <MemoryRouter>
      <ButtonLink to="/recipes/new">New recipe</ButtonLink>
    </MemoryRouter>,
  );
  expect(screen.getByRole("link", { name: "New recipe" }).getAttribute("href")).toBe("/recipes/new");
});
