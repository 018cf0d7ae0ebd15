import "server-only";
import { and, eq, isNull, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { apiKeys, auditLog, bookState, memberships, outfits, users } from "@/db/schema";
import { inTransaction, isDuplicateKey, type Transaction } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import { isCommonPassword } from "@/lib/auth/common-passwords";
import { normalEmail } from "@/lib/auth/email";
import { hashPassword, passwordMatches } from "@/lib/auth/password";
import type { Person } from "@/lib/auth/session";
import { clearPoints, PASSWORD_CHANGE, takePoint } from "@/lib/auth/throttle";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { log } from "@/lib/log";
import { createOutfit } from "./create-outfit";
import { getMember, hasBooks, listMembers, outfitsOf } from "./queries";
import { OWN_WORDS, ownWords, type Me, type Member, type Settings, type SettingsChange, type SignUpInput } from "./schema";

/** Adds a person. Sign-up cannot keep quiet about a mailbox that has an account without mail to answer by, so it says so; it is rate limited. */
export async function insertUser(tx: Transaction, person: { name: string; email: string; password: string }, now: Date): Promise<string> {
  const id = newId();
  const passwordHash = await hashPassword(person.password);
  try {
    await tx.insert(users).values({ id, email: normalEmail(person.email), name: person.name, passwordHash, createdAt: now });
  } catch (error) {
    if (!isDuplicateKey(error)) throw error;
    const message = "There is an account for this email already. Sign in with it.";
    throw new AppError("conflict", message, { errors: [{ path: "email", message }], cause: error });
  }
  return id;
}

/** Makes a person and their outfit, with accounts, books and catalogue. Throws `conflict` when the e-mail has an account. */
export async function signUp(input: SignUpInput, request: { now: Date; requestId: string }): Promise<{ slug: string; outfitId: string; userId: string }> {
  return inTransaction(async (tx) => {
    const userId = await insertUser(tx, input, request.now);
    const made = await createOutfit(tx, input.outfit, { userId }, request.now);
    await tx.insert(auditLog).values({
      outfitId: made.id,
      id: newId(),
      at: request.now,
      memberId: made.memberId,
      action: "sign-up",
      subjectType: "outfit",
      subjectId: made.id,
      requestId: request.requestId,
    });
    return { slug: made.slug, outfitId: made.id, userId };
  });
}

/** The person with the outfits they belong to. */
export async function seeMe(person: Person): Promise<Me> {
  return { ...person, outfits: await outfitsOf(database(), { userId: person.id }) };
}

/** Changes a password and ends every session of the person, this one too. Throws `input` when the present one is wrong. */
export async function changePassword(person: Person, input: { current: string; next: string }): Promise<{ done: true }> {
  await takePoint(PASSWORD_CHANGE, person.id);
  const db = database();
  const [user] = await db.select({ passwordHash: users.passwordHash }).from(users).where(eq(users.id, person.id));
  if (!user || !(await passwordMatches(user.passwordHash, input.current))) throw fieldError("current", "That is not your password. Type it again.");
  if (isCommonPassword(input.next, ownWords(person))) throw fieldError("next", OWN_WORDS.error);
  const passwordHash = await hashPassword(input.next);
  await db
    .update(users)
    .set({ passwordHash, sessionVersion: sql`${users.sessionVersion} + 1` })
    .where(eq(users.id, person.id));
  await clearPoints(PASSWORD_CHANGE, person.id);
  log.info({ event: "password-changed", userId: person.id }, "password changed");
  return { done: true };
}

/** Ends every session of the person, on every device. */
export async function signOutEverywhere(person: Person): Promise<{ done: true }> {
  await database()
    .update(users)
    .set({ sessionVersion: sql`${users.sessionVersion} + 1` })
    .where(eq(users.id, person.id));
  log.info({ event: "signed-out-everywhere", userId: person.id }, "signed out everywhere");
  return { done: true };
}

type MemberRow = NonNullable<Awaited<ReturnType<typeof getMember>>>;

const memberOf = (row: MemberRow, seesEmail: boolean): Member => ({
  id: row.id,
  name: row.name,
  email: seesEmail ? row.email : null,
  role: row.role,
  joinedAt: row.joinedAt.toISOString(),
  version: row.version,
});

/** The outfit's members; e-mail addresses are for the owner. */
export async function seeMembers(ctx: Context): Promise<{ items: Member[]; nextCursor: null }> {
  const rows = await listMembers(database(), { outfitId: ctx.outfit.id });
  return { items: rows.map((row) => memberOf(row, ctx.actor.role === "owner")), nextCursor: null };
}

async function requireMember(tx: Transaction, ctx: Context, id: string): Promise<MemberRow> {
  const member = isId(id) ? await getMember(tx, { outfitId: ctx.outfit.id, id }) : undefined;
  if (!member) throw notFound("member");
  return member;
}

/** Refuses to leave the outfit without an owner. The outfit's lock is held, so two owners cannot step down at once. */
async function requireAnotherOwner(tx: Transaction, ctx: Context, leaving: MemberRow): Promise<void> {
  if (leaving.role !== "owner") return;
  const owners = (await listMembers(tx, { outfitId: ctx.outfit.id })).filter((member) => member.role === "owner");
  if (owners.length <= 1) throw new AppError("conflict", `${leaving.name} is the only owner. Make somebody else an owner first.`);
}

const lockOutfit = (tx: Transaction, ctx: Context) =>
  tx.select({ id: bookState.outfitId }).from(bookState).where(eq(bookState.outfitId, ctx.outfit.id)).for("update");

/** Gives a member another role, from their next request on. Throws `stale`, or `conflict` for the last owner. */
export async function changeMember(ctx: Context, id: string, change: { role: Member["role"] }): Promise<Member> {
  return transact(ctx, async (tx) => {
    await lockOutfit(tx, ctx);
    const before = await requireMember(tx, ctx, id);
    if (before.version !== ctx.ifMatch)
      throw new AppError("stale", `${before.name} was changed since you opened this. Look again.`, { current: memberOf(before, true) });
    if (change.role !== "owner") await requireAnotherOwner(tx, ctx, before);
    await tx
      .update(memberships)
      .set({ role: change.role, version: before.version + 1 })
      .where(and(eq(memberships.outfitId, ctx.outfit.id), eq(memberships.id, id)));
    await audit(tx, ctx, "change-member", { type: "member", id }, { before: before.role, after: change.role });
    return memberOf(await requireMember(tx, ctx, id), true);
  });
}

/** Removes a member: their sessions end everywhere and the API keys they made stop working. What they booked stays in their name. */
export async function removeMember(ctx: Context, id: string): Promise<{ done: true }> {
  return transact(ctx, async (tx) => {
    await lockOutfit(tx, ctx);
    const member = await requireMember(tx, ctx, id);
    await requireAnotherOwner(tx, ctx, member);
    await tx
      .update(memberships)
      .set({ removedAt: ctx.now, version: member.version + 1 })
      .where(and(eq(memberships.outfitId, ctx.outfit.id), eq(memberships.id, id)));
    await tx
      .update(users)
      .set({ sessionVersion: sql`${users.sessionVersion} + 1` })
      .where(eq(users.id, member.userId));
    await tx
      .update(apiKeys)
      .set({ revokedAt: ctx.now })
      .where(and(eq(apiKeys.outfitId, ctx.outfit.id), eq(apiKeys.createdBy, id), isNull(apiKeys.revokedAt)));
    await audit(tx, ctx, "remove-member", { type: "member", id });
    return { done: true };
  });
}

async function settingsIn(tx: Pick<Transaction, "select">, ctx: Context): Promise<Settings> {
  const [row] = await tx.select().from(outfits).where(eq(outfits.id, ctx.outfit.id));
  if (!row) throw notFound("outfit");
  const { slug, name, place, country, currency, weightUnit, timeZone, staleAfterDays, hidesMoney, version } = row;
  return {
    slug,
    name,
    place,
    country,
    currency,
    weightUnit,
    timeZone,
    staleAfterDays,
    hidesMoney,
    version,
    fixed: await hasBooks(tx as Transaction, { outfitId: ctx.outfit.id }),
  };
}

/** The outfit's settings. */
export const seeSettings = (ctx: Context): Promise<Settings> => settingsIn(database(), ctx);

const FIXED = { currency: "Currency", weightUnit: "Weight unit", timeZone: "Time zone" } as const;

/** Changes the outfit's settings. Throws `stale`, or `conflict` for what is fixed once anything was booked. */
export async function changeSettings(ctx: Context, change: SettingsChange): Promise<Settings> {
  return transact(ctx, async (tx) => {
    await lockOutfit(tx, ctx);
    const before = await settingsIn(tx, ctx);
    if (before.version !== ctx.ifMatch) throw new AppError("stale", "The settings were changed since you opened them. Look again.", { current: before });
    for (const [field, label] of Object.entries(FIXED)) {
      const key = field as keyof typeof FIXED;
      if (before.fixed && change[key] !== undefined && change[key] !== before[key]) {
        const message = `${label} is fixed, because the books hold figures in it.`;
        throw new AppError("conflict", message, { errors: [{ path: field, message }] });
      }
    }
    await tx
      .update(outfits)
      .set({ ...change, version: before.version + 1 })
      .where(eq(outfits.id, ctx.outfit.id));
    await audit(tx, ctx, "change-settings", { type: "outfit", id: ctx.outfit.id }, { before, change });
    return settingsIn(tx, ctx);
  });
}
