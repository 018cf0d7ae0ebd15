import "server-only";
import { createHash, randomUUID } from "node:crypto";
import type { NextRequest } from "next/server";
import { env } from "@/lib/env";
import { AppError, fieldError } from "./errors";

const BODY_LIMIT = 1_048_576;

/** The id of this request: the caller's own when it is a plain word, else a new one. */
export function requestIdOf(request: NextRequest): string {
  const given = request.headers.get("x-request-id");
  return given !== null && /^[A-Za-z0-9-]{8,64}$/.test(given) ? given : randomUUID();
}

/** The caller's address, from the proxy in front when there is a trusted one. */
export function addressOf(request: NextRequest): string {
  const forwarded = request.headers.get("x-forwarded-for");
  return env().TRUST_PROXY && forwarded ? (forwarded.split(",").at(-1)?.trim() ?? "unknown") : "direct";
}

async function readText(request: NextRequest): Promise<string> {
  const declared = request.headers.get("content-length");
  const tooLarge = new AppError("too-large", "The request is larger than 1 MB. Send less at a time.");
  if (declared !== null && Number.parseInt(declared, 10) > BODY_LIMIT) throw tooLarge;
  if (!request.body) return "";
  const chunks: Uint8Array[] = [];
  let size = 0;
  const reader = request.body.getReader();
  for (let step = await reader.read(); !step.done; step = await reader.read()) {
    size += step.value.byteLength;
    if (size > BODY_LIMIT) {
      await reader.cancel();
      throw tooLarge;
    }
    chunks.push(step.value);
  }
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(Buffer.concat(chunks));
  } catch (cause) {
    throw new AppError("malformed", "The request is not UTF-8 text.", { cause });
  }
}

/** The JSON body, not yet checked against a schema. An empty body is an empty object where nothing is required. */
export async function readJson(request: NextRequest): Promise<unknown> {
  const type = request.headers.get("content-type")?.split(";")[0]?.trim().toLowerCase();
  const text = await readText(request);
  if (text === "" && type === undefined) return {};
  if (type !== "application/json") throw new AppError("unsupported-media", "Send the request as application/json.");
  try {
    return JSON.parse(text);
  } catch (cause) {
    throw new AppError("malformed", "The request is not JSON that can be read. Check its commas and quotes.", { cause });
  }
}

/** A page of another site must not act with this person's cookie: a foreign origin is refused for everything that changes something. */
export function requireOwnOrigin(request: NextRequest): void {
  if (request.method === "GET" || request.method === "HEAD") return;
  const origin = request.headers.get("origin");
  const site = request.headers.get("sec-fetch-site");
  const own = new URL(env().NEXTAUTH_URL).origin;
  const sameHost = origin !== null && origin.replace(/^https?:\/\//, "") === request.headers.get("host");
  if ((origin !== null && origin !== own && !sameHost) || site === "cross-site" || site === "same-site") {
    throw new AppError("forbidden", "This request came from another site, so it was refused.");
  }
}

/** The version in If-Match. Throws `input` when a change does not say which version it changed. */
export function ifMatchOf(request: NextRequest): number {
  const version = /^(?:W\/)?"?(\d{1,9})"?$/.exec(request.headers.get("if-match") ?? "")?.[1];
  if (version === undefined) throw fieldError("If-Match", "Send If-Match with the version you changed.");
  return Number.parseInt(version, 10);
}

const sha256 = (text: string) => createHash("sha256").update(text).digest("hex");

/** JSON with sorted keys, so that the same input always has the same fingerprint. */
function canonical(value: unknown): string {
  return JSON.stringify(value, (_key, inner: unknown) =>
    inner !== null && typeof inner === "object" && !Array.isArray(inner)
      ? Object.fromEntries(Object.entries(inner).sort(([a], [b]) => (a < b ? -1 : 1)))
      : inner,
  );
}

/** The idempotency key of a request and the fingerprint of what it asks, or null when it carries none. */
export function idempotencyOf(request: NextRequest, asked: { memberId: string; body: unknown }): { keyHash: string; fingerprint: string } | null {
  const key = request.headers.get("idempotency-key");
  if (key === null) return null;
  if (key.length < 1 || key.length > 255) throw fieldError("Idempotency-Key", "Idempotency-Key must have 1 to 255 characters.");
  const operation = `${request.method} ${request.nextUrl.pathname}`;
  return { keyHash: sha256(key), fingerprint: sha256(`${asked.memberId}\n${operation}\n${canonical(asked.body)}`) };
}
