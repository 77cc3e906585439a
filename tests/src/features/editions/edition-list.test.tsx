import { screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { expect, test } from "vitest";
import type { Edition, EditionBuild } from "#shared/contracts/editions.ts";
import type { PeerGroupKey } from "#shared/peers/peer-group.ts";
import { EditionListPage } from "../../../../src/features/editions/edition-list-page.tsx";
import { type Answers, Refusal, renderPage, testOwner } from "../../../support/render-page.tsx";

const admin = { ...testOwner, shop: null, admin: true };
const group = (material: PeerGroupKey["material"], bandIndex: number, gas: PeerGroupKey["gas"] = "air") => ({
  material,
  bandIndex,
  nozzleMm: 0.8,
  gas,
});
const published: Edition = {
  id: "0b6f0d0e-0000-4000-8000-0000000000c1",
  number: 1,
  date: "2026-10-01",
  state: "published",
  builtAt: "2026-10-01T08:00:00.000Z",
  publishedAt: "2026-10-01T09:00:00.000Z",
  releasedGroups: 2,
  changes: {
    appeared: [group("mild-steel", 5), group("mild-steel", 3)],
    changed: [],
    held: [],
    withheld: [],
    unchanged: 0,
  },
};
const built: Edition = {
  ...published,
  id: "0b6f0d0e-0000-4000-8000-0000000000c2",
  number: 2,
  state: "built",
  publishedAt: null,
  releasedGroups: 3,
  changes: {
    appeared: [group("stainless-steel", 3, "nitrogen")],
    changed: [group("mild-steel", 5)],
    held: [],
    withheld: [group("mild-steel", 3)],
    unchanged: 1,
  },
};
const build: EditionBuild = {
  id: "0b6f0d0e-0000-4000-8000-0000000000d1",
  state: "running",
  groupsDone: 3,
  groupsTotal: 12,
  message: "",
  editionId: null,
  requestedAt: "2026-11-01T08:00:00.000Z",
  finishedAt: null,
};

function open(items: Edition[], builds: EditionBuild[] = [], more: Answers = {}) {
  const routes = [{ path: "/editions", element: <EditionListPage /> }];
  const answers = {
    "GET /api/editions": () => ({ items }),
    "GET /api/edition-builds": () => ({ items: builds }),
    ...more,
  };
  return renderPage({ routes, at: "/editions", session: admin, answers });
}

test("a built edition says by name what it changes", async () => {
  open([built, published]);
  const waiting = await screen.findByRole("region", { name: "Edition 2 is built and waits" });
  const text = waiting.textContent?.replaceAll("\u00a0", " ");
  expect(text).toContain("1 group appears");
  expect(text).toContain("Stainless steel, nitrogen2 mm, nozzle 0.8 mm");
  expect(text).toContain("1 group changes");
  expect(text).toContain("Mild steel3.15 mm, nozzle 0.8 mm");
  expect(text).toContain("1 group is withheld");
  expect(text).toContain("1 group stays as it was");
  expect(text).not.toContain("held:");
  expect(screen.getByText("Current")).toBeTruthy();
  expect(screen.getByText("Published 1 October 2026")).toBeTruthy();
});

test("publishing is a step of its own, with the same summary, sent once", async () => {
  const items = [built, published];
  const publication = () => {
    items[0] = { ...built, state: "published", publishedAt: "2026-11-01T09:00:00.000Z" };
    return items[0];
  };
  const { sent } = open(items, [], { [`POST /api/editions/${built.id}/publication`]: publication });
  await userEvent.click(await screen.findByRole("button", { name: "Publish…" }));
  const dialog = within(screen.getByRole("dialog", { name: "Publish edition 2 to every member?" }));
  expect(dialog.getByText(/1\sgroup is withheld/)).toBeTruthy();
  expect(sent.filter(({ method }) => method === "POST")).toEqual([]);
  await userEvent.dblClick(dialog.getByRole("button", { name: "Publish edition 2" }));
  expect(await screen.findByText("Edition 2 is published.")).toBeTruthy();
  expect(await screen.findByText("Replaced")).toBeTruthy();
  expect(screen.queryByRole("button", { name: "Publish…" })).toBeNull();
  expect(sent.filter(({ method }) => method === "POST")).toHaveLength(1);
});

test("why it cannot come out is said in the dialog", async () => {
  const detail = "Edition 3 came out while this one was built: build again";
  open([built], [], { [`POST /api/editions/${built.id}/publication`]: new Refusal("wrong-state", { detail }) });
  await userEvent.click(await screen.findByRole("button", { name: "Publish…" }));
  await userEvent.click(screen.getByRole("button", { name: "Publish edition 2" }));
  expect((await within(screen.getByRole("dialog")).findByRole("alert")).textContent).toBe(detail);
});

test("discarding says what is lost", async () => {
  const items = [built];
  const { sent } = open(items, [], {
    [`DELETE /api/editions/${built.id}`]: () => {
      items[0] = { ...built, state: "discarded" };
    },
  });
  await userEvent.click(await screen.findByRole("button", { name: "Discard…" }));
  expect(screen.getByRole("dialog").textContent).toContain("The published edition stands");
  await userEvent.click(screen.getByRole("button", { name: "Discard the edition" }));
  expect(await screen.findByText("Edition 2 is discarded.")).toBeTruthy();
  expect(await screen.findByText("Discarded")).toBeTruthy();
  expect(sent.some(({ method }) => method === "DELETE")).toBe(true);
});

test("a build that runs already shows how far it is, and the edition appears when it ends", async () => {
  const items: Edition[] = [];
  const builds = [build];
  open(items, builds);
  const bar = await screen.findByRole("progressbar", { name: "Building an edition" });
  expect(bar.getAttribute("aria-valuetext")).toBe("3 of 12 groups");
  expect(bar.getAttribute("aria-valuenow")).toBe("25");
  for (const button of screen.getAllByRole("button", { name: "Building…" })) {
    expect(button.getAttribute("aria-busy")).toBe("true");
  }
  items.push(built);
  builds[0] = { ...build, state: "done", groupsDone: 12 };
  expect(await screen.findByRole("region", { name: "Edition 2 is built and waits" }, { timeout: 4000 })).toBeTruthy();
  expect(screen.queryByRole("progressbar")).toBeNull();
});

test("the button begins one build, however often it is pressed", async () => {
  const builds: EditionBuild[] = [];
  const { sent } = open([published], builds, {
    "POST /api/edition-builds": () => {
      builds[0] = { ...build, state: "queued", groupsDone: 0, groupsTotal: null };
      return builds[0];
    },
  });
  await userEvent.dblClick(await screen.findByRole("button", { name: "Build an edition" }));
  expect(await screen.findByRole("progressbar", { name: "Waiting to be built" })).toBeTruthy();
  expect(sent.filter(({ method }) => method === "POST")).toHaveLength(1);
});

test("a failed build says why, and that the published edition stands", async () => {
  open([published], [{ ...build, state: "failed", message: "The database went away" }]);
  const notice = await screen.findByRole("alert");
  expect(notice.textContent).toContain("The database went away");
  expect(notice.textContent).toContain("The published edition stands");
  expect(screen.getByRole("button", { name: "Build an edition" }).getAttribute("aria-busy")).toBeNull();
});

test("before the first edition", async () => {
  open([]);
  expect(await screen.findByRole("heading", { name: "No edition yet" })).toBeTruthy();
});
