import * as z from "zod";
import { PERMISSIONS } from "@/lib/auth/permissions";
import type { RouteDefinition } from "./route";

/** A route as the document sees it: where it is and what it declares. */
export type ListedRoute = { path: string; method: "get" | "post" | "patch" | "delete"; definition: RouteDefinition };

type Json = Record<string, unknown>;

const schemaOf = (schema: z.ZodType, io: "input" | "output"): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: "any", target: "draft-2020-12" });
  return rest;
};

const problem = { $ref: "#/components/responses/Problem" };

function parametersOf({ path, definition }: ListedRoute): Json[] {
  const inPath = [...path.matchAll(/\{(\w+)\}/g)].map((match) => ({ name: match[1], in: "path", required: true, schema: { type: "string" } }));
  const query = definition.query ? (schemaOf(definition.query, "input") as { properties?: Record<string, Json>; required?: string[] }) : {};
  const inQuery = Object.entries(query.properties ?? {}).map(([name, schema]) => ({
    name,
    in: "query",
    required: query.required?.includes(name) ?? false,
    schema,
  }));
  const headers = [
    ...(definition.idempotent ? [{ name: "Idempotency-Key", in: "header", required: false, schema: { type: "string", maxLength: 255 } }] : []),
    ...(definition.versioned ? [{ name: "If-Match", in: "header", required: true, schema: { type: "string" } }] : []),
  ];
  return [...inPath, ...inQuery, ...headers];
}

function permissionWords(permission: RouteDefinition["permission"]): string {
  if (permission === "public") return "Anybody.";
  if (permission === "person") return "Anybody who is signed in.";
  return `Roles: ${PERMISSIONS[permission].join(", ")}.`;
}

function operationOf(listed: ListedRoute): Json {
  const { definition, method, path } = listed;
  const good =
    definition.status === 204
      ? { description: "Done." }
      : { description: "Done.", content: { "application/json": { schema: schemaOf(definition.response, "output") } } };
  const refusals = ["400", "401", "403", "404", "409", "412", "413", "415", "422", "429", "500"];
  return {
    operationId: `${method}${path.replaceAll(/[^A-Za-z]+(\w)/g, (_match, letter: string) => letter.toUpperCase()).replaceAll(/\W/g, "")}`,
    summary: definition.summary,
    description: permissionWords(definition.permission),
    parameters: parametersOf(listed),
    ...(definition.body ? { requestBody: { required: true, content: { "application/json": { schema: schemaOf(definition.body, "input") } } } } : {}),
    responses: { [String(definition.status)]: good, ...Object.fromEntries(refusals.map((status) => [status, problem])) },
    ...(definition.permission === "public" ? { security: [] } : {}),
  };
}

const PROBLEM_SCHEMA = {
  type: "object",
  required: ["type", "title", "status", "detail"],
  properties: {
    type: { type: "string" },
    title: { type: "string" },
    status: { type: "integer" },
    detail: { type: "string", description: "What is wrong and what to do." },
    errors: { type: "array", items: { type: "object", required: ["path", "message"], properties: { path: { type: "string" }, message: { type: "string" } } } },
    current: { description: "With 412: the thing as it is now." },
    requestId: { type: "string", description: "With 5xx: the id that the log has." },
  },
};

/** The OpenAPI 3.1 document of the given routes, made from the schemas that check them. */
export function openApiDocument(routes: ListedRoute[]): Json {
  const paths: Record<string, Json> = {};
  for (const listed of routes) paths[listed.path] = { ...paths[listed.path], [listed.method]: operationOf(listed) };
  return {
    openapi: "3.1.0",
    info: {
      title: "Curbweight",
      version: "1",
      description:
        "Weights and prices are decimal strings; money is whole minor units of the outfit's currency in fields ending in Minor; dates are YYYY-MM-DD in the outfit's time zone; ids are UUIDs that the caller may choose.",
    },
    paths,
    security: [{ apiKey: [] }, { session: [] }],
    components: {
      securitySchemes: {
        apiKey: { type: "http", scheme: "bearer", description: "An API key of the outfit." },
        session: { type: "apiKey", in: "cookie", name: "next-auth.session-token" },
      },
      responses: { Problem: { description: "An RFC 9457 problem document.", content: { "application/problem+json": { schema: PROBLEM_SCHEMA } } } },
    },
  };
}
