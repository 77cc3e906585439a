import { z } from "zod";
import * as accounts from "#shared/contracts/accounts.ts";
import * as applications from "#shared/contracts/applications.ts";
import * as editions from "#shared/contracts/editions.ts";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import * as machines from "#shared/contracts/machines.ts";
import * as members from "#shared/contracts/members.ts";
import * as peers from "#shared/contracts/peers.ts";
import { Problem, type ProblemType, problemTypes } from "#shared/contracts/problem.ts";
import * as recipes from "#shared/contracts/recipes.ts";
import * as sharing from "#shared/contracts/sharing.ts";
import * as startingRecipes from "#shared/contracts/starting-recipes.ts";
import * as testCuts from "#shared/contracts/test-cuts.ts";

const contracts = {
  accounts,
  applications,
  editions,
  machines,
  members,
  peers,
  recipes,
  sharing,
  startingRecipes,
  testCuts,
};

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === "object" && value !== null && "path" in value && "access" in value && "response" in value;
}

/** Every endpoint of the product with the feature it belongs to and its name there. */
export function listEndpoints(): { feature: string; name: string; endpoint: Endpoint }[] {
  return Object.entries(contracts).flatMap(([feature, module]) =>
    Object.entries(module).flatMap(([name, value]) => (isEndpoint(value) ? [{ feature, name, endpoint: value }] : [])),
  );
}

type JsonSchema = { type?: string; properties?: Record<string, object>; required?: string[] };

function schemaOf(schema: z.ZodType, io: "input" | "output"): JsonSchema {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: "any" });
  return rest as JsonSchema;
}

function parametersOf(schema: z.ZodType, where: "path" | "query"): object[] {
  const { properties = {}, required = [] } = schemaOf(schema, "input");
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: where,
    required: where === "path" || required.includes(name),
    schema: property,
  }));
}

function problemsOf(endpoint: Endpoint): ProblemType[] {
  const common: ProblemType[] = ["invalid-request", "too-many-requests", "internal", "database-unavailable"];
  const signedIn: ProblemType[] = endpoint.access === "anyone" ? [] : ["not-signed-in", "not-allowed"];
  const written: ProblemType[] = endpoint.method === "get" ? [] : ["origin-refused"];
  return [...new Set([...common, ...signedIn, ...written, ...endpoint.problems])];
}

function problemResponses(endpoint: Endpoint): Record<string, object> {
  const byStatus = new Map<number, ProblemType[]>();
  for (const type of problemsOf(endpoint)) {
    const { status } = problemTypes[type];
    byStatus.set(status, [...(byStatus.get(status) ?? []), type]);
  }
  return Object.fromEntries(
    [...byStatus].map(([status, types]) => [
      String(status),
      {
        description: types.map((type) => `${type}: ${problemTypes[type].title}`).join("; "),
        content: { "application/problem+json": { schema: { $ref: "#/components/schemas/Problem" } } },
      },
    ]),
  );
}

function operationOf(feature: string, name: string, endpoint: Endpoint): object {
  const body = schemaOf(endpoint.body, "input");
  const hasBody = Object.keys(body.properties ?? {}).length > 0;
  const content = { [endpoint.mediaType]: { schema: schemaOf(endpoint.response, "output") } };
  const good = { description: endpoint.summary, ...(endpoint.status !== 204 && { content }) };
  return {
    operationId: name,
    tags: [feature],
    summary: endpoint.summary,
    description: `Access: ${endpoint.access}`,
    parameters: [...parametersOf(endpoint.params, "path"), ...parametersOf(endpoint.query, "query")],
    ...(hasBody && { requestBody: { required: true, content: { "application/json": { schema: body } } } }),
    responses: { [endpoint.status]: good, ...problemResponses(endpoint) },
    ...(endpoint.access !== "anyone" && { security: [{ session: [] }] }),
  };
}

/** OpenAPI 3.1 of everything under /api, generated from the contracts the server itself parses with. */
export function openApiDocument(): object {
  const paths: Record<string, Record<string, object>> = {};
  for (const { feature, name, endpoint } of listEndpoints()) {
    const path = endpoint.path.replace(/:(\w+)/g, "{$1}");
    paths[path] = { ...paths[path], [endpoint.method]: operationOf(feature, name, endpoint) };
  }
  return {
    openapi: "3.1.0",
    info: { title: "Tempermark", version: "1", description: "Figures carry their unit in their name. Times are UTC." },
    tags: Object.keys(contracts).map((name) => ({ name })),
    paths,
    components: {
      schemas: { Problem: schemaOf(Problem, "output") },
      securitySchemes: { session: { type: "apiKey", in: "cookie", name: "tempermark.session" } },
    },
  };
}
