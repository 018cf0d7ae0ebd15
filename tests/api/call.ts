import { NextRequest } from "next/server";
import type { RouteHandler } from "@/lib/http/route";
import type { Problem } from "@/lib/http/errors";

type Call = {
  key?: string;
  params?: Record<string, string>;
  query?: Record<string, string>;
  body?: unknown;
  /** Sent as it is, for requests that are not JSON. */
  rawBody?: string;
  headers?: Record<string, string>;
  method?: string;
};

export type Answer<T = Record<string, never>> = { status: number; body: T; problem: Problem; headers: Headers };

/** Calls a route handler with a real request, the way the framework does: same parsing, same database, no server in between. */
export async function call<T = unknown>(handler: RouteHandler, outfit: { slug: string } | null, input: Call = {}): Promise<Answer<T>> {
  const url = new URL("http://127.0.0.1:3000/api/test");
  for (const [name, value] of Object.entries(input.query ?? {})) url.searchParams.set(name, value);
  const body = input.rawBody ?? (input.body === undefined ? undefined : JSON.stringify(input.body));
  const request = new NextRequest(url, {
    method: input.method ?? (body === undefined ? "GET" : "POST"),
    headers: {
      ...(input.key ? { authorization: `Bearer ${input.key}` } : {}),
      ...(body === undefined ? {} : { "content-type": "application/json" }),
      ...input.headers,
    },
    ...(body === undefined ? {} : { body }),
  });
  const params = { ...(outfit ? { outfit: outfit.slug } : {}), ...input.params };
  // The framework hands over nothing where the path has no brackets.
  const response = await handler(request, { params: Promise.resolve(Object.keys(params).length === 0 ? undefined : params) });
  const text = await response.text();
  const parsed: unknown = text === "" ? null : JSON.parse(text);
  return { status: response.status, body: parsed as T, problem: parsed as Problem, headers: response.headers };
}
