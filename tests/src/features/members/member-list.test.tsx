import { screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, expect, test } from "vitest";
import type { Member } from "#shared/contracts/members.ts";
import { MemberListPage } from "../../../../src/features/members/member-list-page.tsx";
import { type Answers, Refusal, renderPage, type SentRequest, testOwner } from "../../../support/render-page.tsx";

const admin = { ...testOwner, shop: null, admin: true };
const active: Member = {
  id: "0b6f0d0e-0000-4000-8000-0000000000b1",
  name: "Brackenhold Plate",
  place: "Brackenhold",
  state: "active",
  stateReason: "",
  joinedAt: "2025-04-01T00:00:00.000Z",
  people: 2,
  machines: 1,
  sharedRecipes: 14,
};
const suspended: Member = {
  ...active,
  id: "0b6f0d0e-0000-4000-8000-0000000000b2",
  name: "Quillmoor Cutting",
  state: "suspended",
  stateReason: "Shared figures it never cut",
};

beforeEach(() => sessionStorage.clear());

function open(at: string, items: Member[], more: Answers = {}) {
  const routes = [{ path: "/members", element: <MemberListPage /> }];
  const list = ({ query }: SentRequest) => {
    const [search, state] = [query.get("search") ?? "", query.get("state")];
    return { items: items.filter((m) => m.name.toLowerCase().includes(search) && (!state || m.state === state)) };
  };
  return renderPage({ routes, at, session: admin, answers: { "GET /api/members": list, ...more } });
}

test("each member with how much it shares, and no way to what it shares", async () => {
  open("/members", [active, suspended]);
  const row = await screen.findByRole("row", { name: /^Brackenhold Plate Brackenhold Active 1 Apr 2025 2 1 14 / });
  expect(within(row).queryByRole("link")).toBeNull();
  expect(screen.getByRole("row", { name: /Quillmoor Cutting.*Suspended.*Shared figures it never cut/ })).toBeTruthy();
  expect(screen.getByText("2 shops")).toBeTruthy();
});

test("search and state live in the address", async () => {
  const { router } = open("/members?state=suspended", [active, suspended]);
  expect(await screen.findByText("1 shop")).toBeTruthy();
  expect(screen.queryByText("Brackenhold Plate")).toBeNull();
  await userEvent.type(screen.getByRole("searchbox", { name: "Search" }), "brack");
  expect(router.state.location.search).toBe("?state=suspended&search=brack");
  await userEvent.click(await screen.findByRole("button", { name: "Clear search and state" }));
  expect(router.state.location.search).toBe("");
  expect(await screen.findByText("2 shops")).toBeTruthy();
});

test("a network without members points at the applications", async () => {
  open("/members", []);
  expect(await screen.findByRole("heading", { name: "No member yet" })).toBeTruthy();
  expect(screen.getByRole("link", { name: "applications" }).getAttribute("href")).toBe("/applications");
});

test("suspending says what it does, needs a reason and is sent once", async () => {
  const items = [active];
  const suspension = () => {
    items[0] = { ...active, state: "suspended", stateReason: "Asked for it" };
    return items[0];
  };
  const { sent } = open("/members", items, { [`POST /api/members/${active.id}/suspension`]: suspension });
  await userEvent.click(await screen.findByRole("button", { name: "Suspend Brackenhold Plate" }));
  const dialog = within(screen.getByRole("dialog", { name: "Suspend Brackenhold Plate?" }));
  expect(dialog.getByText(/sessions end at once/)).toBeTruthy();
  expect(dialog.getByText(/leaves the next edition/)).toBeTruthy();
  await userEvent.click(dialog.getByRole("button", { name: "Suspend the shop" }));
  expect(await dialog.findByText("Give the reason")).toBeTruthy();
  await userEvent.type(dialog.getByRole("textbox", { name: "Reason" }), "Asked for it");
  await userEvent.dblClick(dialog.getByRole("button", { name: "Suspend the shop" }));
  expect(await screen.findByRole("button", { name: "Reinstate Brackenhold Plate" })).toBeTruthy();
  expect(screen.getByText("Brackenhold Plate is suspended.")).toBeTruthy();
  const posts = sent.filter(({ method }) => method === "POST");
  expect(posts.map(({ body }) => body)).toEqual([{ reason: "Asked for it" }]);
});

test("reinstating", async () => {
  const items = [suspended];
  const back = () => {
    items[0] = { ...suspended, state: "active", stateReason: "" };
    return items[0];
  };
  open("/members", items, { [`DELETE /api/members/${suspended.id}/suspension`]: back });
  await userEvent.click(await screen.findByRole("button", { name: "Reinstate Quillmoor Cutting" }));
  await userEvent.click(screen.getByRole("button", { name: "Reinstate the shop" }));
  expect(await screen.findByText("Quillmoor Cutting is active again.")).toBeTruthy();
  expect(await screen.findByRole("button", { name: "Suspend Quillmoor Cutting" })).toBeTruthy();
});

test("a state that moved meanwhile is said in the dialog", async () => {
  const detail = "Quillmoor Cutting is not suspended";
  open("/members", [suspended], {
    [`DELETE /api/members/${suspended.id}/suspension`]: new Refusal("wrong-state", { detail }),
  });
  await userEvent.click(await screen.findByRole("button", { name: "Reinstate Quillmoor Cutting" }));
  await userEvent.click(screen.getByRole("button", { name: "Reinstate the shop" }));
  expect((await screen.findByRole("alert")).textContent).toBe(detail);
});
