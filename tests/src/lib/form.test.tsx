import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { z } from "zod";
import { ApiProblem } from "../../../src/lib/api-problem.ts";
import { dropAllDrafts, keepDraft, readDraft } from "../../../src/lib/draft.ts";
import { useProblemForm } from "../../../src/lib/form.ts";
import { DraftNotice, FormProblem } from "../../../src/lib/form-problem.tsx";
import { fieldOfPointer } from "../../../src/lib/form-problems.ts";
import { FormQuantity } from "../../../src/lib/form-quantity.tsx";
import { Button } from "../../../src/ui/button.tsx";
import { TextField } from "../../../src/ui/text-field.tsx";

const schema = z.object({
  name: z.string().trim().min(1, "Give it a name"),
  feed: z.string().transform((text, context) => {
    const value = Number(text);
    if (value >= 50 && value <= 15_000) return value;
    context.addIssue("Between 50 and 15,000 mm/min");
    return z.NEVER;
  }),
});
type Out = z.output<typeof schema>;
const defaults = { name: "", feed: "" };
const read = (text: string) => ({ ok: true as const, text: `${text} mm/min` });

const submit = vi.fn<(output: Out, context: { idempotencyKey: string }) => Promise<unknown>>();

function Sample() {
  const f = useProblemForm({ id: "sample", schema, defaults, submit, fieldNames: { "/feedMmMin": "feed" } });
  return (
    <form onSubmit={f.onSubmit} noValidate aria-label="Sample">
      <DraftNotice restored={f.restored} onStartOver={f.startOver} />
      <FormProblem problem={f.problem} />
      <TextField label="Name" {...f.field("name")} />
      <FormQuantity control={f.form.control} name="feed" label="Feed rate" unit="mm/min" read={read} />
      <Button type="submit" kind="primary" pending={f.pending}>
        Save
      </Button>
    </form>
  );
}

beforeEach(() => {
  submit.mockReset().mockResolvedValue(undefined);
});
afterEach(() => sessionStorage.clear());

const name = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Name" });
const feed = () => screen.getByRole<HTMLInputElement>("textbox", { name: "Feed rate" });
const save = () => userEvent.click(screen.getByRole("button", { name: "Save" }));
const keys = () => submit.mock.calls.map(([, { idempotencyKey }]) => idempotencyKey);

const refuse = (kind: ApiProblem["kind"], status: number, errors: ApiProblem["errors"] = []) =>
  new ApiProblem(kind, { title: `Refused: ${kind}`, status, errors: [...errors] });

test("sends what the schema makes of the text, on Enter too", async () => {
  render(<Sample />);
  await userEvent.type(name(), " Copper ");
  await userEvent.type(feed(), "2600{Enter}");
  await waitFor(() => expect(submit).toHaveBeenCalledTimes(1));
  expect(submit.mock.lastCall?.[0]).toEqual({ name: "Copper", feed: 2600 });
});

test("wrong fields keep the form from being sent; the first of them gets the focus", async () => {
  render(<Sample />);
  await userEvent.type(feed(), "7");
  await save();
  expect(submit).not.toHaveBeenCalled();
  expect(screen.getByText("Give it a name")).toBeTruthy();
  expect(screen.getByText("Between 50 and 15,000 mm/min")).toBeTruthy();
  await waitFor(() => expect(document.activeElement).toBe(name()));
  expect(feed().value).toBe("7");
});

test("a refusal of the server appears at its field, which gets the focus", async () => {
  submit.mockRejectedValue(
    refuse("invalid-request", 400, [{ pointer: "/feedMmMin", detail: "Too quick for this table" }]),
  );
  render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "9000");
  await save();
  expect(await screen.findByText("Too quick for this table")).toBeTruthy();
  await waitFor(() => expect(document.activeElement).toBe(feed()));
  expect(screen.queryByRole("alert")).toBeNull();
});

test("a refusal of no known field stands above the form with its words", async () => {
  submit.mockRejectedValue(refuse("invalid-request", 400, [{ pointer: "/secret", detail: "Not this one" }]));
  render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "900");
  await save();
  expect((await screen.findByRole("alert")).textContent).toBe("Refused: invalid-requestNot this one");
});

test("what was typed survives an ended session and a reload, and is offered with a way out", async () => {
  submit.mockRejectedValueOnce(refuse("not-signed-in", 401));
  const { unmount } = render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "900");
  await save();
  const again = await screen.findByRole("link", { name: "Sign in again" });
  expect(again.getAttribute("href")).toBe("/auth/sign-in?returnTo=%2F");
  unmount();

  render(<Sample />);
  expect([name().value, feed().value]).toEqual(["Copper", "900"]);
  await userEvent.click(screen.getByRole("button", { name: "Start over" }));
  expect([name().value, feed().value]).toEqual(["", ""]);
  expect(readDraft("sample")).toBeUndefined();
});

test("the draft is forgotten once it is sent", async () => {
  render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "900");
  expect(readDraft("sample")).toEqual({ name: "Copper", feed: "900" });
  await save();
  await waitFor(() => expect(readDraft("sample")).toBeUndefined());
});

test("sent again unchanged it carries the same key, so that it counts once; changed, another", async () => {
  submit.mockRejectedValue(refuse("unreachable", 0));
  render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "900");
  await save();
  expect((await screen.findByRole("alert")).textContent).toContain("Nothing was lost");
  await save();
  await userEvent.type(name(), " 2");
  await save();
  await waitFor(() => expect(submit).toHaveBeenCalledTimes(3));
  const [first, second, third] = keys();
  expect(second).toBe(first);
  expect(third).not.toBe(first);
});

test("a second press while sending does nothing", async () => {
  let finish = () => {};
  submit.mockImplementation(() => new Promise<void>((resolve) => (finish = resolve)));
  render(<Sample />);
  await userEvent.type(name(), "Copper");
  await userEvent.type(feed(), "900{Enter}");
  await waitFor(() => expect(screen.getByRole("button", { name: "Save" }).getAttribute("aria-busy")).toBe("true"));
  await save();
  await userEvent.type(feed(), "{Enter}");
  expect(submit).toHaveBeenCalledTimes(1);
  finish();
  await waitFor(() => expect(screen.getByRole("button", { name: "Save" }).getAttribute("aria-busy")).toBeNull());
});

test("signing out leaves no draft behind", () => {
  keepDraft("one", { a: "1" });
  sessionStorage.setItem("other", "stays");
  dropAllDrafts();
  expect(readDraft("one")).toBeUndefined();
  expect(sessionStorage.getItem("other")).toBe("stays");
});

test.each([
  ["/setpoints/feedMmMin", "setpoints.feedMmMin"],
  ["/a~1b/c~0d", "a/b.c~d"], // RFC 6901, section 4: ~1 is "/", ~0 is "~"
  ["?limit", "limit"],
])("pointer %s names field %s", (pointer, field) => {
  expect(fieldOfPointer(pointer)).toBe(field);
});
