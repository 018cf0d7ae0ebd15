import "server-only";
import type { Pool } from "mysql2/promise";
import { RateLimiterMySQL } from "rate-limiter-flexible";
import { databasePool } from "@/db/client";
import { env } from "@/lib/env";
import { AppError } from "@/lib/http/errors";

type Rule = { name: string; points: number; seconds: number };

/** Failures by e-mail and address: ten, then a quarter of an hour. Another address can still sign in, so nobody locks the owner out. */
export const SIGN_IN_PAIR: Rule = { name: "sign-in-pair", points: 10, seconds: 900 };
/** Failures by address over many e-mails. */
export const SIGN_IN_ADDRESS: Rule = { name: "sign-in-address", points: 60, seconds: 900 };
/** Failures by e-mail over many addresses: NIST SP 800-63B-4 allows no more than a hundred in a row. */
export const SIGN_IN_EMAIL: Rule = { name: "sign-in-email", points: 100, seconds: 86_400 };
/** An address that a person signed in from: their failures from there are not mixed with those of strangers elsewhere. */
export const SIGN_IN_KNOWN: Rule = { name: "sign-in-known", points: 1, seconds: 90 * 86_400 };
/** Wrong present passwords while changing one. */
export const PASSWORD_CHANGE: Rule = { name: "password-change", points: 10, seconds: 900 };
/** Generous, because without a proxy in front that names them all callers share one address. */
export const SIGN_UP: Rule = { name: "sign-up", points: 300, seconds: 3600 };
export const PUBLIC_READ: Rule = { name: "public", points: 600, seconds: 60 };

/** One limiter a rule, made anew when the pool was closed and opened again. */
const limiters = new WeakMap<Pool, Map<string, RateLimiterMySQL>>();

function limiter({ name, points, seconds }: Rule): RateLimiterMySQL {
  const pool = databasePool();
  const ofPool = limiters.get(pool) ?? new Map<string, RateLimiterMySQL>();
  limiters.set(pool, ofPool);
  const known = ofPool.get(name);
  if (known) return known;
  const made = new RateLimiterMySQL({
    // The library speaks the callback interface; its table comes from our own migrations.
    storeClient: pool.pool,
    storeType: "pool",
    dbName: new URL(env().DATABASE_URL).pathname.slice(1),
    tableName: "rate_limits",
    tableCreated: true,
    keyPrefix: name,
    points,
    duration: seconds,
  });
  ofPool.set(name, made);
  return made;
}

const seconds = (milliseconds: number) => Math.max(1, Math.ceil(milliseconds / 1000));

const tooMany = (wait: number) =>
  new AppError("too-many", `Too many tries. Wait ${wait < 90 ? `${wait} seconds` : `${Math.ceil(wait / 60)} minutes`}, then try again.`, { retryAfter: wait });

/** Counts one try and refuses past the limit. Counting comes before the work it guards, so that many tries at once cannot slip past together. */
export async function takePoint(rule: Rule, key: string): Promise<void> {
  const state = await limiter(rule).penalty(key);
  if (state.consumedPoints > rule.points) throw tooMany(seconds(state.msBeforeNext));
}

/** Takes back the count of one try that turned out well. */
export async function returnPoint(rule: Rule, key: string): Promise<void> {
  await limiter(rule).reward(key);
}

/** Forgets the tries of a key, after it proved itself. */
export async function clearPoints(rule: Rule, key: string): Promise<void> {
  await limiter(rule).delete(key);
}

/** Remembers a key for as long as its rule says. */
export async function remember(rule: Rule, key: string): Promise<void> {
  await limiter(rule).set(key, rule.points, rule.seconds);
}

/** Whether a key is remembered. */
export async function isRemembered(rule: Rule, key: string): Promise<boolean> {
  return (await limiter(rule).get(key)) !== null;
}
