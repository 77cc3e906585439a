import { fireEvent, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, expect, test } from "vitest";
import type { Application } from "#shared/contracts/applications.ts";
import { ApplicationListPage } from "../../../../src/features/applications/application-list-page.tsx";
import { type Answers, Refusal, renderPage, testOwner } from "../../../support/render-page.tsx";
import { sampleApplication } from "./application-samples.ts";

const admin = { ...testOwner, shop: null, admin: true };
const waiting = sampleApplication();
const declined = sampleApplication({
  id: "0b6f0d0e-0000-4000-8000-0000000000a2",
  shopName: "Gnarlwick Signs",
  state: "declined",
  reason: "Cuts by laser",
  decidedAt: "2026-11-02T10:00:00.000Z",
});

beforeEach(() => sessionStorage.clear());

/** A list that decisions change, as the server's does. */
function open(items: Application[], decisions: (items: Application[]) => Answers = () => ({})) {
  const routes = [{ path: "/applications", element: <ApplicationListPage /> }];
  const answers = { "GET /api/applications": () => ({ items }), ...decisions(items) };
  return renderPage({ routes, at: "/applications", session: admin, answers });
}

const decide = (items: Application[], state: "admitted" | "declined") => () => {
  items[0] = { ...items[0]!, state, decidedAt: "2026-11-05T10:00:00.000Z" };
  return items[0];
};
const admission = `POST /api/applications/${waiting.id}/admission`;
const refusal = `POST /api/applications/${waiting.id}/refusal`;

const showDecided = async () => userEvent.click(await screen.findByRole("tab", { name: "Decided" }));

test("waiting applications in full, decided ones behind their tab with the reason", async () => {
  open([waiting, declined]);
  const card = await screen.findByRole("article", { name: "Osterhollow Fabrication" });
  expect(card.textContent).toContain("owner@osterhollow.example");
  expect(card.textContent).toContain("Gates and brackets from 3 mm mild steel.");
  await showDecided();
  const decided = screen.getByRole("table", { name: /Decided applications/ });
  expect(
    within(decided).getByRole("row", { name: /Gnarlwick Signs.*Declined.*2 Nov 2026.*Cuts by laser/ }),
  ).toBeTruthy();
});

test("none waits", async () => {
  open([]);
  expect(await screen.findByRole("heading", { name: "No application waits" })).toBeTruthy();
  await showDecided();
  expect(screen.getByRole("heading", { name: "Nothing decided yet" })).toBeTruthy();
});

test("admitting asks first, is sent once, and moves the shop to the decided", async () => {
  const { sent } = open([waiting], (items) => ({ [admission]: decide(items, "admitted") }));
  await userEvent.click(await screen.findByRole("button", { name: "Admit" }));
  expect(sent.filter(({ method }) => method === "POST")).toEqual([]);
  const act = screen.getByRole("button", { name: "Admit the shop" });
  fireEvent.click(act);
  fireEvent.click(act); // before anything had time to show that it is pending
  expect(await screen.findByText("Osterhollow Fabrication is admitted.")).toBeTruthy();
  await showDecided();
  expect(await screen.findByRole("row", { name: /Osterhollow Fabrication.*Admitted/ })).toBeTruthy();
  expect(sent.filter(({ method }) => method === "POST")).toHaveLength(1);
});

test("declining needs a reason", async () => {
  const { sent } = open([waiting], (items) => ({ [refusal]: decide(items, "declined") }));
  await userEvent.click(await screen.findByRole("button", { name: "Decline" }));
  const act = screen.getByRole("button", { name: "Decline the application" });
  await userEvent.click(act);
  expect(await screen.findByText("Give a reason the applicant can use")).toBeTruthy();
  await userEvent.type(screen.getByRole("textbox", { name: "Reason" }), "No table yet");
  await userEvent.click(act);
  await screen.findByRole("heading", { name: "No application waits" });
  await showDecided();
  expect(await screen.findByRole("row", { name: /Osterhollow Fabrication.*Declined/ })).toBeTruthy();
  expect(sent.find(({ method }) => method === "POST")?.body).toEqual({ reason: "No table yet" });
});

test.each([
  ["Admit", "Admit the shop", admission],
  ["Decline", "Decline the application", refusal],
])("another admin was quicker: %s", async (ask, act, endpoint) => {
  open([waiting], (items) => ({
    [endpoint]: () => {
      decide(items, "declined")();
      return new Refusal("already-decided");
    },
  }));
  await userEvent.click(await screen.findByRole("button", { name: ask }));
  const reason = screen.queryByRole("textbox", { name: "Reason" });
  if (reason) await userEvent.type(reason, "No table yet");
  await userEvent.click(screen.getByRole("button", { name: act }));
  expect(await screen.findByText("Osterhollow Fabrication had been declined already")).toBeTruthy();
  expect(screen.queryByRole("dialog")).toBeNull();
  expect(screen.getByText("Another admin was quicker. That decision stands; yours changed nothing.")).toBeTruthy();
});

test("an address that belongs to a member is said in the dialog", async () => {
  const detail = "This e-mail address belongs to a member of the network already";
  open([waiting], () => ({ [admission]: new Refusal("already-exists", { detail }) }));
  await userEvent.click(await screen.findByRole("button", { name: "Admit" }));
  await userEvent.click(screen.getByRole("button", { name: "Admit the shop" }));
  expect((await within(screen.getByRole("dialog")).findByRole("alert")).textContent).toBe(detail);
});
