import "server-only";
import { and, eq, isNull, lt, notExists } from "drizzle-orm";
import { getToken, type GetTokenParams } from "next-auth/jwt";
import { database } from "@/db/client";
import { apiKeys, endedSessions, memberships, outfits, users } from "@/db/schema";
import { currencyExponent } from "@/lib/arithmetic/money";
import { now } from "@/lib/clock";
import { env } from "@/lib/env";
import { log } from "@/lib/log";
import type { Actor, Outfit } from "./context";
import { hashToken } from "./tokens";

/** A person as their session token has them; the version is still to be checked against the database. */
type Claim = { userId: string; sessionVersion: number; sessionId: string };

/** Cookies and headers of a request, however the framework hands them over. */
export type Carrier = GetTokenParams["req"];

async function claimOf(carrier: Carrier): Promise<Claim | null> {
  const token = await getToken({ req: carrier, secret: env().NEXTAUTH_SECRET, secureCookie: env().NEXTAUTH_URL.startsWith("https:") });
  if (typeof token?.sub !== "string" || typeof token.sessionVersion !== "number" || typeof token.sessionId !== "string") return null;
  return { userId: token.sub, sessionVersion: token.sessionVersion, sessionId: token.sessionId };
}

const notEnded = (claim: Claim) => notExists(database().select({ id: endedSessions.id }).from(endedSessions).where(eq(endedSessions.id, claim.sessionId)));

/** Ends one session for good. `expiresAt` is when its last token would have run out. */
export async function endSession(sessionId: string, expiresAt: Date): Promise<void> {
  const db = database();
  await db.insert(endedSessions).ignore().values({ id: sessionId, expiresAt });
  await db.delete(endedSessions).where(lt(endedSessions.expiresAt, now()));
  log.info({ event: "sign-out" }, "signed out");
}

export type Person = { id: string; name: string; email: string };

/** The person who is signed in, or null: no session, or one that was ended everywhere. */
export async function personOf(carrier: Carrier): Promise<Person | null> {
  const claim = await claimOf(carrier);
  if (!claim) return null;
  const [user] = await database()
    .select({ id: users.id, name: users.name, email: users.email })
    .from(users)
    .where(and(eq(users.id, claim.userId), eq(users.sessionVersion, claim.sessionVersion), notEnded(claim)));
  return user ?? null;
}

const outfitColumns = {
  id: outfits.id,
  slug: outfits.slug,
  name: outfits.name,
  place: outfits.place,
  country: outfits.country,
  currency: outfits.currency,
  weightUnit: outfits.weightUnit,
  timeZone: outfits.timeZone,
  staleAfterDays: outfits.staleAfterDays,
  hidesMoney: outfits.hidesMoney,
  version: outfits.version,
};

export type Presence = { outfit: Outfit; actor: Actor };

/** "signed-out" when there is no good session; "absent" when the person does not belong to that outfit, or there is none. */
export type PresenceAnswer = Presence | "signed-out" | "absent";

/** The signed-in member behind a request, in the outfit named by `slug`: one query. */
export async function memberOf(carrier: Carrier, slug: string): Promise<PresenceAnswer> {
  const claim = await claimOf(carrier);
  if (!claim) return "signed-out";
  const [row] = await database()
    .select({
      name: users.name,
      sessionVersion: users.sessionVersion,
      memberId: memberships.id,
      role: memberships.role,
      outfit: outfitColumns,
    })
    .from(users)
    .leftJoin(outfits, eq(outfits.slug, slug))
    .leftJoin(memberships, and(eq(memberships.userId, users.id), eq(memberships.outfitId, outfits.id), isNull(memberships.removedAt)))
    .where(and(eq(users.id, claim.userId), notEnded(claim)));
  if (!row || row.sessionVersion !== claim.sessionVersion) return "signed-out";
  if (!row.outfit || !row.memberId || !row.role) return "absent";
  return {
    outfit: { ...row.outfit, exponent: currencyExponent(row.outfit.currency) },
    actor: { memberId: row.memberId, userId: claim.userId, name: row.name, role: row.role, apiKeyId: null },
  };
}

/** The member behind an API key, in the outfit named by `slug`. */
export async function keyHolderOf(key: string, slug: string, now: Date): Promise<PresenceAnswer> {
  const db = database();
  const [row] = await db
    .select({
      keyId: apiKeys.id,
      role: apiKeys.role,
      lastUsedAt: apiKeys.lastUsedAt,
      memberId: memberships.id,
      userId: memberships.userId,
      keyName: apiKeys.name,
      outfit: outfitColumns,
    })
    .from(apiKeys)
    .innerJoin(outfits, eq(outfits.id, apiKeys.outfitId))
    .innerJoin(memberships, and(eq(memberships.outfitId, apiKeys.outfitId), eq(memberships.id, apiKeys.createdBy), isNull(memberships.removedAt)))
    .where(and(eq(apiKeys.keyHash, hashToken(key)), isNull(apiKeys.revokedAt)));
  if (!row) return "signed-out";
  if (row.outfit.slug !== slug) return "absent";
  if (!row.lastUsedAt || now.getTime() - row.lastUsedAt.getTime() > 60_000) {
    await db
      .update(apiKeys)
      .set({ lastUsedAt: now })
      .where(and(eq(apiKeys.outfitId, row.outfit.id), eq(apiKeys.id, row.keyId)));
  }
  return {
    outfit: { ...row.outfit, exponent: currencyExponent(row.outfit.currency) },
    actor: { memberId: row.memberId, userId: row.userId, name: row.keyName, role: row.role, apiKeyId: row.keyId },
  };
}
