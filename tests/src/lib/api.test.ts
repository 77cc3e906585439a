import { afterEach, beforeEach, expect, test, vi } from "vitest";
import { z } from "zod";
import { defineEndpoint, Nothing } from "#shared/contracts/endpoint.ts";
import { call, urlOf } from "../../../src/lib/api.ts";
import { ApiProblem } from "../../../src/lib/api-problem.ts";

const getPart = defineEndpoint({
  method: "get",
  path: "/api/parts/:id",
  summary: "One part",
  access: "operator",
  params: z.object({ id: z.string() }),
  query: z.object({ q: z.string().optional(), state: z.array(z.string()).optional() }),
  response: z.object({ id: z.string(), feedMmMin: z.number() }),
});
const makePart = defineEndpoint({
  method: "post",
  path: "/api/parts",
  summary: "Make a part",
  access: "operator",
  body: z.object({ name: z.string() }),
  response: Nothing,
  status: 204,
});

const fetched = vi.fn<typeof fetch>();
const sent = () => new Headers(fetched.mock.lastCall?.[1]?.headers);

beforeEach(() => vi.stubGlobal("fetch", fetched));
afterEach(() => {
  vi.unstubAllGlobals();
  fetched.mockReset();
});

const answer = (body: unknown, init?: ResponseInit) => fetched.mockResolvedValue(Response.json(body, init));

async function problemOf(promise: Promise<unknown>): Promise<ApiProblem> {
  const error = await promise.then(
    () => undefined,
    (reason: unknown) => reason,
  );
  if (!(error instanceof ApiProblem)) throw new Error(`expected an ApiProblem, got ${String(error)}`);
  return error;
}

test("fills the path, leaves empty query values out and repeats lists", () => {
  const input = { params: { id: "a/b" }, query: { q: "", state: ["draft", "proven"] } };
  expect(urlOf(getPart, input)).toBe("/api/parts/a%2Fb?state=draft&state=proven");
  expect(urlOf(makePart)).toBe("/api/parts");
});

test("gives the parsed answer and sends what the server asks of a browser", async () => {
  answer({ id: "p1", feedMmMin: 2600, addedLater: true });
  await expect(call(getPart, { params: { id: "p1" } })).resolves.toEqual({ id: "p1", feedMmMin: 2600 });
  expect(sent().get("X-Tempermark")).toBe("1");
  expect(sent().has("Idempotency-Key")).toBe(false);
});

test("a POST carries a key: its own each time, or the one it is given", async () => {
  fetched.mockImplementation(async () => new Response(null, { status: 204 }));
  await expect(call(makePart, { body: { name: "x" } })).resolves.toBeUndefined();
  const first = sent().get("Idempotency-Key");
  await call(makePart, { body: { name: "x" } });
  expect(first).toMatch(/^[\w-]{8,64}$/);
  expect(sent().get("Idempotency-Key")).not.toBe(first);
  await call(makePart, { body: { name: "x" }, idempotencyKey: "again-and-again" });
  expect(sent().get("Idempotency-Key")).toBe("again-and-again");
  expect(fetched.mock.lastCall?.[1]?.body).toBe('{"name":"x"}');
});

test("rejects with the server's refusal, field by field", async () => {
  const errors = [{ detail: "Between 50 and 15,000 mm/min", pointer: "/feedMmMin" }];
  answer(
    { type: "/problems/invalid-request", title: "Something in the request is not right", status: 400, errors },
    { status: 400, headers: { "X-Request-Id": "r-77" } },
  );
  const problem = await problemOf(call(getPart, { params: { id: "p1" } }));
  expect(problem).toMatchObject({ kind: "invalid-request", status: 400, errors, requestId: "r-77", passing: false });
});

test("nothing answering, and a gateway answering for the server, are passing failures", async () => {
  fetched.mockRejectedValue(new TypeError("Failed to fetch"));
  expect(await problemOf(call(makePart, { body: { name: "x" } }))).toMatchObject({
    kind: "unreachable",
    passing: true,
  });
  fetched.mockResolvedValue(new Response("<h1>Bad gateway</h1>", { status: 502 }));
  expect(await problemOf(call(makePart, { body: { name: "x" } }))).toMatchObject({ kind: "unreadable", passing: true });
});

test("an answer against the contract is refused rather than shown", async () => {
  answer({ id: "p1", feedMmMin: "quick" });
  expect(await problemOf(call(getPart, { params: { id: "p1" } }))).toMatchObject({
    kind: "unreadable",
    passing: false,
  });
  fetched.mockResolvedValue(new Response("<!doctype html>"));
  expect(await problemOf(call(getPart, { params: { id: "p1" } }))).toMatchObject({ kind: "unreadable" });
});

test("a call given up is no problem of the server's", async () => {
  const stop = new AbortController();
  fetched.mockImplementation(async () => {
    stop.abort();
    throw new TypeError("aborted");
  });
  await expect(call(getPart, { params: { id: "p1" } }, stop.signal)).rejects.toMatchObject({ name: "AbortError" });
});
