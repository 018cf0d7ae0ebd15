import { beforeAll, describe, expect, it } from "vitest";
import { openRoutes } from "@/app/api/openapi.json/routes";
import { can, type Permission, type Role } from "@/lib/auth/permissions";
import { openApiDocument } from "@/lib/http/openapi";
import { newId } from "@/lib/ids";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { routePathsOnDisk } from "./routes-on-disk";

const ROLES: Role[] = ["owner", "bookkeeper", "collector", "sorter"];
const routes = openRoutes();
const outfitRoutes = routes.filter(({ definition }) => definition.permission !== "public" && definition.permission !== "person");
const name = (route: (typeof routes)[number]) => `${route.method.toUpperCase()} ${route.path}`;

let outfit: TestOutfit;
let other: TestOutfit;

beforeAll(async () => {
  outfit = await makeOutfit();
  other = await makeOutfit();
});

/** A request that carries the right shape of parameters, and ids that nobody has. */
function request(route: (typeof routes)[number], key: string | undefined, more: Record<string, unknown> = {}) {
  const params = Object.fromEntries([...route.path.matchAll(/\{(\w+)\}/g)].map((match) => [match[1] ?? "", match[1] === "month" ? "2026-01" : newId()]));
  const { outfit: _slug, ...rest } = params;
  return {
    method: route.method.toUpperCase(),
    params: rest,
    ...(key === undefined ? {} : { key }),
    ...(route.definition.body ? { body: {} } : {}),
    headers: (route.definition.versioned ? { "if-match": '"1"' } : {}) as Record<string, string>,
    ...more,
  };
}

describe("every route of the API", () => {
  it("A-4: is in the list that the OpenAPI document is made from", () => {
    expect([...new Set(routes.map((route) => route.path))].sort()).toEqual(routePathsOnDisk());
  });

  it("is described in the OpenAPI document with its roles and its answer", () => {
    const document = openApiDocument(routes) as { paths: Record<string, Record<string, { summary: string; description: string; responses: object }>> };
    for (const route of routes) {
      const operation = document.paths[route.path]?.[route.method];
      expect(operation?.summary, name(route)).toMatch(/\w/);
      expect(operation?.description, name(route)).toMatch(/\w/);
      expect(Object.keys(operation?.responses ?? {}), name(route)).toContain(String(route.definition.status));
    }
  });

  it.each(outfitRoutes.map((route) => [name(route), route] as const))("%s: answers 401 to nobody", async (_name, route) => {
    const answer = await call(route.handler, outfit, request(route, undefined));
    expect(answer.status).toBe(401);
    expect(answer.headers.get("content-type")).toBe("application/problem+json");
  });

  it.each(outfitRoutes.map((route) => [name(route), route] as const))("%s: does not exist for another outfit's key", async (_name, route) => {
    const answer = await call(route.handler, outfit, request(route, other.keys.owner));
    expect(answer.status).toBe(404);
    expect(JSON.stringify(answer.body)).not.toContain(outfit.id);
  });

  it.each(outfitRoutes.flatMap((route) => ROLES.map((role) => [name(route), role, route] as const)))(
    "%s: lets a %s in exactly as the table says",
    async (_name, role, route) => {
      const allowed = can(role, route.definition.permission as Permission);
      const answer = await call(route.handler, outfit, request(route, outfit.keys[role]));
      if (allowed) expect(answer.status, JSON.stringify(answer.body)).not.toBe(403);
      else expect(answer.status).toBe(403);
      expect(answer.status).toBeLessThan(500);
    },
  );
});

describe("every route that takes a body", () => {
  const withBody = routes.filter(({ definition }) => definition.body && definition.permission !== "person");
  const keyFor = (route: (typeof routes)[number]) => (route.definition.permission === "public" ? undefined : outfit.keys.owner);

  it.each(withBody.map((route) => [name(route), route] as const))("%s: refuses broken JSON, other media and more than a megabyte", async (_name, route) => {
    const base = request(route, keyFor(route), { body: undefined });
    const broken = await call(route.handler, outfit, { ...base, rawBody: '{"a": ' });
    expect(broken.status).toBe(400);
    const form = await call(route.handler, outfit, {
      ...base,
      rawBody: "a=1",
      headers: { ...base.headers, "content-type": "application/x-www-form-urlencoded" },
    });
    expect(form.status).toBe(415);
    const huge = await call(route.handler, outfit, { ...base, rawBody: JSON.stringify({ note: "x".repeat(1_100_000) }) });
    expect(huge.status).toBe(413);
  });

  it.each(withBody.map((route) => [name(route), route] as const))("%s: names a field that it does not know", async (_name, route) => {
    const answer = await call(route.handler, outfit, request(route, keyFor(route), { body: { surprise: 1 } }));
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain("surprise");
  });

  it.each(withBody.map((route) => [name(route), route] as const))("%s: answers 422 to a list, a number and null", async (_name, route) => {
    for (const body of [[], 7, null]) {
      const answer = await call(route.handler, outfit, request(route, keyFor(route), { body: undefined, rawBody: JSON.stringify(body) }));
      expect(answer.status, JSON.stringify(body)).toBe(422);
    }
  });
});
