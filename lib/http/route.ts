import "server-only";
import type { NextRequest } from "next/server";
import * as z from "zod";
import { databaseErrorText, isDuplicateKey, isMissingReference } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import { can, type Permission } from "@/lib/auth/permissions";
import { keyHolderOf, memberOf, personOf, type Person, type PresenceAnswer } from "@/lib/auth/session";
import { takePoint, type PUBLIC_READ } from "@/lib/auth/throttle";
import { dateIn, now } from "@/lib/clock";
import { log } from "@/lib/log";
import { AppError, notFound, problemOf } from "./errors";
import { plainErrors } from "./plain-errors";
import { addressOf, idempotencyOf, ifMatchOf, readJson, requestIdOf, requireOwnOrigin } from "./request";

type Schema = z.ZodType;
type Output<S> = S extends Schema ? z.output<S> : undefined;
type RouteContext = { params: Promise<Record<string, string | string[] | undefined> | undefined> };

type Shape<Q, B, R> = {
  /** One line for the API page. */
  summary: string;
  query?: Q;
  body?: B;
  response: R;
  /** Status of a good answer; 200 unless said. */
  status?: 200 | 201 | 204;
};

/** What the OpenAPI document and the inventory tests read off a route. */
export type RouteDefinition = {
  permission: Permission | "person" | "public";
  summary: string;
  query?: Schema;
  body?: Schema;
  response: Schema;
  status: number;
  idempotent: boolean;
  versioned: boolean;
};

export type RouteHandler = ((request: NextRequest, context: RouteContext) => Promise<Response>) & { definition: RouteDefinition };

function parse<S extends Schema>(schema: S, value: unknown): z.output<S> {
  const parsed = schema.safeParse(value, { reportInput: true });
  if (parsed.success) return parsed.data;
  const errors = plainErrors(parsed.error);
  throw new AppError("input", errors.length === 1 ? (errors[0]?.message ?? "") : `${errors.length} things to put right.`, { errors });
}

function queryOf(request: NextRequest): Record<string, string> {
  const query: Record<string, string> = {};
  for (const [name, value] of request.nextUrl.searchParams) {
    if (name in query) throw new AppError("input", `Say ${name} once.`, { errors: [{ path: name, message: `Say ${name} once.` }] });
    query[name] = value;
  }
  return query;
}

async function paramsOf(context: RouteContext): Promise<Record<string, string>> {
  // A path without brackets comes with no parameters at all.
  const given = await context.params;
  return Object.fromEntries(Object.entries(given ?? {}).map(([name, value]) => [name, String(value)]));
}

/** The database's own refusals, for races that slipped between a use case's look and its write. */
function understood(error: unknown): unknown {
  if (error instanceof AppError) return error;
  if (isDuplicateKey(error)) return new AppError("conflict", "There is one like this already. Look at the list before you add another.", { cause: error });
  if (isMissingReference(error)) return new AppError("not-found", "Something this points at is not here.", { cause: error });
  if (databaseErrorText(error).startsWith("closed-month")) {
    return new AppError("books-refuse", "That month was closed. Date it in an open month.", { cause: error });
  }
  return error;
}

const HEADERS = { "cache-control": "no-store" };

function failed(error: unknown, request: NextRequest, requestId: string): Response {
  const known = understood(error);
  const problem = problemOf(known, requestId);
  const facts = { requestId, method: request.method, path: request.nextUrl.pathname, status: problem.status };
  if (problem.status >= 500) log.error({ ...facts, err: known }, "request failed");
  else if (problem.status === 401 || problem.status === 403 || problem.status === 429) log.warn({ ...facts, event: "denied" }, problem.title);
  const wait: Record<string, string> = known instanceof AppError && known.retryAfter !== null ? { "retry-after": String(known.retryAfter) } : {};
  return new Response(JSON.stringify(problem), {
    status: problem.status,
    headers: { ...HEADERS, "content-type": "application/problem+json", "x-request-id": requestId, ...wait },
  });
}

function answered(result: unknown, response: Schema, status: number, requestId: string, replayed: boolean): Response {
  const headers: Record<string, string> = { ...HEADERS, "x-request-id": requestId, ...(replayed ? { "idempotency-replayed": "true" } : {}) };
  if (status === 204) return new Response(null, { status, headers });
  const body: unknown = response.parse(result);
  if (body !== null && typeof body === "object" && "version" in body) headers.etag = `"${String(body.version)}"`;
  return new Response(JSON.stringify(body), { status, headers: { ...headers, "content-type": "application/json" } });
}

function presenceOf(answer: PresenceAnswer) {
  if (answer === "signed-out") throw new AppError("unauthenticated", "Sign in, or send an API key that is in use.");
  if (answer === "absent") throw notFound("outfit");
  return answer;
}

/** Who is asking, in which outfit. A bearer key wins over a cookie and needs no origin check, because browsers never send it by themselves. */
async function contextOf(request: NextRequest, slug: string, requestId: string): Promise<Context> {
  const moment = now();
  const bearer = /^Bearer (\S{1,200})$/i.exec(request.headers.get("authorization") ?? "")?.[1];
  if (bearer === undefined) requireOwnOrigin(request);
  const { outfit, actor } = presenceOf(bearer === undefined ? await memberOf(request, slug) : await keyHolderOf(bearer, slug, moment));
  return { outfit, actor, requestId, now: moment, today: dateIn(outfit.timeZone, moment), idempotency: null, ifMatch: null, replayed: false };
}

function requirePermission(ctx: Context, permission: Permission): void {
  if (!can(ctx.actor.role, permission)) {
    throw new AppError("forbidden", `A ${ctx.actor.role} may not do this. Ask the owner of ${ctx.outfit.name}.`);
  }
}

/**
 * A route under /api/o/{outfit}. Declares who may call it, what it takes and what it answers; the handler makes one service call.
 * `idempotent` routes take an Idempotency-Key; `versioned` ones need If-Match.
 */
export function route<Q extends Schema | undefined = undefined, B extends Schema | undefined = undefined, R extends Schema = Schema>(
  definition: Shape<Q, B, R> & {
    permission: Permission;
    idempotent?: boolean;
    versioned?: boolean;
    handler: (input: { ctx: Context; params: Record<string, string>; query: Output<Q>; body: Output<B> }) => Promise<z.input<R>>;
  },
): RouteHandler {
  const { permission, query, body, response, status = 200, idempotent = false, versioned = false, summary } = definition;
  const run = async (request: NextRequest, context: RouteContext): Promise<Response> => {
    const requestId = requestIdOf(request);
    try {
      const params = await paramsOf(context);
      const ctx = await contextOf(request, params.outfit ?? "", requestId);
      requirePermission(ctx, permission);
      if (versioned) ctx.ifMatch = ifMatchOf(request);
      const parsedQuery = query ? parse(query, queryOf(request)) : undefined;
      const parsedBody = body ? parse(body, await readJson(request)) : undefined;
      if (idempotent) ctx.idempotency = idempotencyOf(request, { memberId: ctx.actor.memberId, body: parsedBody ?? null });
      const result = await definition.handler({ ctx, params, query: parsedQuery as Output<Q>, body: parsedBody as Output<B> });
      return answered(result, response, status, requestId, ctx.replayed);
    } catch (error) {
      return failed(error, request, requestId);
    }
  };
  return Object.assign(run, {
    definition: { permission, summary, response, status, idempotent, versioned, ...(query ? { query } : {}), ...(body ? { body } : {}) },
  });
}

/** A route of a signed-in person, outside any outfit. */
export function personRoute<Q extends Schema | undefined = undefined, B extends Schema | undefined = undefined, R extends Schema = Schema>(
  definition: Shape<Q, B, R> & {
    permission: "person";
    handler: (input: {
      person: Person;
      params: Record<string, string>;
      query: Output<Q>;
      body: Output<B>;
      requestId: string;
      now: Date;
    }) => Promise<z.input<R>>;
  },
): RouteHandler {
  const { permission, query, body, response, status = 200, summary } = definition;
  const run = async (request: NextRequest, context: RouteContext): Promise<Response> => {
    const requestId = requestIdOf(request);
    try {
      requireOwnOrigin(request);
      const person = await personOf(request);
      if (!person) throw new AppError("unauthenticated", "Sign in first.");
      const params = await paramsOf(context);
      const parsedQuery = query ? parse(query, queryOf(request)) : undefined;
      const parsedBody = body ? parse(body, await readJson(request)) : undefined;
      const result = await definition.handler({ person, params, query: parsedQuery as Output<Q>, body: parsedBody as Output<B>, requestId, now: now() });
      return answered(result, response, status, requestId, false);
    } catch (error) {
      return failed(error, request, requestId);
    }
  };
  return Object.assign(run, {
    definition: { permission, summary, response, status, idempotent: false, versioned: false, ...(query ? { query } : {}), ...(body ? { body } : {}) },
  });
}

/** A route that anybody may call. It says so, and it says how often. */
export function publicRoute<Q extends Schema | undefined = undefined, B extends Schema | undefined = undefined, R extends Schema = Schema>(
  definition: Shape<Q, B, R> & {
    permission: "public";
    limit: typeof PUBLIC_READ;
    /** `person` is who is signed in, if anybody: most public routes do not care. */
    handler: (input: {
      person: Person | null;
      params: Record<string, string>;
      query: Output<Q>;
      body: Output<B>;
      requestId: string;
      now: Date;
    }) => Promise<z.input<R>>;
  },
): RouteHandler {
  const { permission, query, body, response, status = 200, summary, limit } = definition;
  const run = async (request: NextRequest, context: RouteContext): Promise<Response> => {
    const requestId = requestIdOf(request);
    try {
      requireOwnOrigin(request);
      await takePoint(limit, addressOf(request));
      const person = await personOf(request);
      const params = await paramsOf(context);
      const parsedQuery = query ? parse(query, queryOf(request)) : undefined;
      const parsedBody = body ? parse(body, await readJson(request)) : undefined;
      const result = await definition.handler({ person, params, query: parsedQuery as Output<Q>, body: parsedBody as Output<B>, requestId, now: now() });
      return answered(result, response, status, requestId, false);
    } catch (error) {
      return failed(error, request, requestId);
    }
  };
  return Object.assign(run, {
    definition: { permission, summary, response, status, idempotent: false, versioned: false, ...(query ? { query } : {}), ...(body ? { body } : {}) },
  });
}
