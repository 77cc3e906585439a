import { screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { beforeEach, expect, test } from "vitest";
import type { Session } from "#shared/contracts/accounts.ts";
import { JoinPage, JoinReceivedPage } from "../../../../src/features/applications/join-page.tsx";
import { OwnApplication } from "../../../../src/features/applications/own-application.tsx";
import { type Answers, Refusal, renderPage, testOwner } from "../../../support/render-page.tsx";
import { sampleApplication } from "./application-samples.ts";

const visitor: Session = { ...testOwner, user: null, shop: null };
const withoutShop: Session = { ...testOwner, shop: null };
const routes = [
  { path: "/", element: <OwnApplication /> },
  { path: "/join", element: <JoinPage /> },
  { path: "/join/received", element: <JoinReceivedPage /> },
];
const received = { "POST /api/applications": { received: true } };

beforeEach(() => sessionStorage.clear());

const open = (session: Session, at: string, answers: Answers) => renderPage({ routes, at, session, answers });
const field = (name: string) => screen.getByRole<HTMLInputElement>("textbox", { name });

async function fillIn(email = "Owner@Osterhollow.example") {
  await userEvent.type(await screen.findByRole("textbox", { name: "Shop" }), "Osterhollow Fabrication");
  await userEvent.type(field("Where it is"), "Lower Osterhollow");
  await userEvent.type(field("Your name"), "Mab");
  await userEvent.type(field("E-mail address"), email);
  await userEvent.clear(field("CNC plasma tables"));
  await userEvent.type(field("CNC plasma tables"), "2");
  await userEvent.type(field("What the shop cuts"), "Gates and brackets");
}

const send = () => screen.getByRole("button", { name: "Send application" });

test("a signed-out visitor applies once, however often they click, and reads what happens next", async () => {
  const { sent, router } = open(visitor, "/join", received);
  await fillIn();
  await userEvent.dblClick(send());
  expect(await screen.findByRole("heading", { level: 1, name: "Your application is in" })).toBeTruthy();
  expect(router.state.location.pathname).toBe("/join/received");
  expect(screen.getByText(/No e-mail is sent/)).toBeTruthy();
  expect(sent).toHaveLength(1);
  expect(sent[0]?.body).toEqual({
    shopName: "Osterhollow Fabrication",
    place: "Lower Osterhollow",
    contactName: "Mab",
    email: "owner@osterhollow.example",
    machines: 2,
    about: "Gates and brackets",
  });
});

test("what is missing is said at its field, and nothing is sent", async () => {
  const { sent } = open(visitor, "/join", received);
  await screen.findByRole("textbox", { name: "Shop" });
  await userEvent.clear(field("CNC plasma tables"));
  await userEvent.type(field("CNC plasma tables"), "many");
  await userEvent.click(send());
  expect(await screen.findByText("Give the shop's name")).toBeTruthy();
  expect(screen.getByText("A whole number of tables, 1 to 99")).toBeTruthy();
  expect(field("Shop").getAttribute("aria-invalid")).toBe("true");
  expect(sent).toEqual([]);
});

test("a refusal keeps what was typed", async () => {
  open(visitor, "/join", { "POST /api/applications": new Refusal("too-many-requests") });
  await fillIn();
  await userEvent.click(send());
  expect((await screen.findByRole("alert")).textContent).toContain("Too many requests. Wait a moment");
  expect(field("Shop").value).toBe("Osterhollow Fabrication");
});

test("a member is told so before applying for another shop", async () => {
  open(testOwner, "/join", received);
  expect(await screen.findByText("Brackenhold is a member already")).toBeTruthy();
  expect(field("E-mail address").value).toBe("");
});

const own = (application: unknown) => ({ "GET /api/account/application": { application } });

test("somebody signed in who never applied finds the form with name and address filled in", async () => {
  open(withoutShop, "/", own(null));
  expect(await screen.findByRole("heading", { name: "Ask to join" })).toBeTruthy();
  expect(field("Your name").value).toBe("Ode Venn");
  expect(field("E-mail address").value).toBe("ode@brackenhold.example");
});

test.each([
  [sampleApplication(), "Your application waits"],
  [sampleApplication({ state: "admitted" }), "Osterhollow Fabrication is admitted"],
])("an application is told of: %#", async (application, heading) => {
  open(withoutShop, "/", own(application));
  expect(await screen.findByRole("heading", { level: 1, name: heading })).toBeTruthy();
  expect(screen.getByText("Osterhollow Fabrication, sent 3 November 2026")).toBeTruthy();
  expect(screen.queryByRole("button", { name: "Send application" })).toBeNull();
});

test("a declined one shows the reason and can be sent anew", async () => {
  const declined = sampleApplication({ state: "declined", reason: "Only CNC tables, for now" });
  const { router } = open(withoutShop, "/", { ...own(declined), ...received });
  expect(await screen.findByText("Only CNC tables, for now")).toBeTruthy();
  await userEvent.type(field("Shop"), "Osterhollow Fabrication");
  await userEvent.type(field("Where it is"), "Lower Osterhollow");
  await userEvent.type(field("What the shop cuts"), "We have a table now");
  await userEvent.click(send());
  expect(await screen.findByRole("heading", { name: "Your application is in" })).toBeTruthy();
  expect(router.state.location.pathname).toBe("/join/received");
});
