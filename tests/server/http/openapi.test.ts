import { Validator } from "@seriousme/openapi-schema-validator";
import { afterAll, beforeAll, expect, test } from "vitest";
import { listEndpoints, openApiDocument } from "#server/http/openapi.ts";
import { createTestApi, type TestApi, type TestClient } from "../../support/api.ts";

interface Operation {
  operationId: string;
  parameters: { name: string; in: string; required: boolean }[];
  responses: Record<string, unknown>;
}
type Paths = Record<string, Record<string, Operation>>;
const document = openApiDocument() as { openapi: string; paths: Paths };
const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, operation })),
);

let api: TestApi;
let visitor: TestClient;
beforeAll(async () => {
  api = await createTestApi();
  visitor = await api.as();
});
afterAll(() => api.close());

test("the document is valid OpenAPI 3.1", async () => {
  const validator = new Validator();
  expect(await validator.validate(structuredClone(document))).toEqual({ valid: true });
  expect(validator.version).toBe("3.1");
});

test("it is served to anybody as it is", async () => {
  const { body } = await visitor.get("/api/openapi.json").expect(200);
  expect(body).toEqual(JSON.parse(JSON.stringify(document)));
});

test("it lists every endpoint once, each under its own name", () => {
  expect(operations.length).toBe(listEndpoints().length);
  expect(new Set(operations.map(({ operation }) => operation.operationId)).size).toBe(operations.length);
});

test("every {parameter} of a path is described", () => {
  for (const { path, operation } of operations) {
    const inPath = operation.parameters.filter((parameter) => parameter.in === "path").map(({ name }) => name);
    expect(inPath.sort()).toEqual([...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]).sort());
  }
});

// Signed in or not, an unknown path is 404: a visitor gets 401 only where something stands behind the address.
test.each(operations.map(({ method, path }) => [method, path]))("%s %s leads to a handler", async (method, path) => {
  const address = path.replace(/\{\w+\}/g, "00000000-0000-4000-8000-000000000000");
  const answer = await visitor[method as "get"](address).send(method === "get" ? undefined : {});
  expect(answer.status).not.toBe(404);
  const endpoint = document.paths[path]?.[method];
  expect(Object.keys(endpoint?.responses ?? {})).toContain(String(answer.status));
});
