import "server-only";
import { and, eq, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { auditLog, invitations, memberships } from "@/db/schema";
import { inTransaction, type Transaction } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import type { Person } from "@/lib/auth/session";
import { hashToken, makeToken } from "@/lib/auth/tokens";
import { audit, transact } from "@/lib/books/transact";
import { env } from "@/lib/env";
import { AppError, notFound } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { invitationByHash, listInvitations } from "./queries";
import type { AcceptInput, Invitation } from "./schema";
import { insertUser } from "./service";

const GOOD_FOR_MILLISECONDS = 7 * 86_400_000;

type Row = { id: string; role: Role; note: string | null; createdAt: Date; expiresAt: Date };

const invitationOf = (row: Row): Invitation => ({ ...row, createdAt: row.createdAt.toISOString(), expiresAt: row.expiresAt.toISOString() });

/** Invitations that still work; their links are not shown again. */
export async function seeInvitations(ctx: Context): Promise<{ items: Invitation[]; nextCursor: null }> {
  const rows = await listInvitations(database(), { outfitId: ctx.outfit.id, now: ctx.now });
  return { items: rows.map(invitationOf), nextCursor: null };
}

/** Makes a link that lets one person join with a role, good for seven days. The answer has the link; only its hash is kept. */
export async function invite(ctx: Context, input: { role: Role; note?: string | undefined }): Promise<Invitation & { url: string }> {
  return transact(ctx, async (tx) => {
    const token = makeToken("join");
    const row = { id: newId(), role: input.role, note: input.note ?? null, createdAt: ctx.now, expiresAt: new Date(ctx.now.getTime() + GOOD_FOR_MILLISECONDS) };
    await tx.insert(invitations).values({ ...row, outfitId: ctx.outfit.id, tokenHash: hashToken(token), createdBy: ctx.actor.memberId });
    await audit(tx, ctx, "invite", { type: "invitation", id: row.id }, { role: input.role });
    // Links are made from the configured address, never from the request's Host.
    return { ...invitationOf(row), url: new URL(`/invitation/${token}`, env().NEXTAUTH_URL).href };
  });
}

/** Takes an invitation back: its link stops working. */
export async function revokeInvitation(ctx: Context, id: string): Promise<{ done: true }> {
  return transact(ctx, async (tx) => {
    const [result] = isId(id)
      ? await tx
          .update(invitations)
          .set({ revokedAt: ctx.now })
          .where(and(eq(invitations.outfitId, ctx.outfit.id), eq(invitations.id, id), isNull(invitations.acceptedAt), isNull(invitations.revokedAt)))
      : [{ affectedRows: 0 }];
    if (result.affectedRows === 0) throw notFound("invitation");
    await audit(tx, ctx, "revoke-invitation", { type: "invitation", id });
    return { done: true };
  });
}

/** What a link is good for, or null when it does not work (any more). */
export async function seeInvitation(token: string, now: Date): Promise<{ outfitName: string; slug: string; role: Role; inviter: string } | null> {
  if (!/^join_[\w-]{20,64}$/.test(token)) return null;
  const found = await invitationByHash(database(), { tokenHash: hashToken(token) });
  if (!found || found.acceptedAt !== null || found.revokedAt !== null || found.expiresAt <= now) return null;
  const { outfitName, slug, role, inviter } = found;
  return { outfitName, slug, role, inviter };
}

/** Opens a membership: a new one, or the one the person had before. A person who belongs already keeps their role. */
async function join(tx: Transaction, seat: { outfitId: string; userId: string; role: Role }, now: Date): Promise<string> {
  const [before] = await tx
    .select({ id: memberships.id, removedAt: memberships.removedAt, version: memberships.version })
    .from(memberships)
    .where(and(eq(memberships.userId, seat.userId), eq(memberships.outfitId, seat.outfitId)));
  if (!before) {
    const id = newId();
    await tx.insert(memberships).values({ ...seat, id, joinedAt: now });
    return id;
  }
  if (before.removedAt === null) throw new AppError("conflict", "You belong to this outfit already. Open it from your outfits.");
  await tx
    .update(memberships)
    .set({ role: seat.role, removedAt: null, joinedAt: now, version: before.version + 1 })
    .where(and(eq(memberships.outfitId, seat.outfitId), eq(memberships.id, before.id)));
  return before.id;
}

/** Joins an outfit by a link, once: the signed-in person, or a new one who says who they are. Throws `not-found` for a link that does not work. */
export async function acceptInvitation(
  token: string,
  input: AcceptInput,
  who: { person: Person | null; now: Date; requestId: string },
): Promise<{ slug: string }> {
  const gone = new AppError("not-found", "This link does not work any more. Ask the owner for a new one.");
  if (!/^join_[\w-]{20,64}$/.test(token)) throw gone;
  return inTransaction(async (tx) => {
    const found = await invitationByHash(tx, { tokenHash: hashToken(token) });
    if (!found) throw gone;
    // Taking the invitation is one conditional update, so that two who use the link at once cannot both get in.
    const [taken] = await tx
      .update(invitations)
      .set({ acceptedAt: who.now })
      .where(and(eq(invitations.outfitId, found.outfitId), eq(invitations.id, found.id), isNull(invitations.acceptedAt), isNull(invitations.revokedAt)));
    if (taken.affectedRows === 0 || found.expiresAt <= who.now) throw gone;
    if (!who.person && !input.person) throw new AppError("unauthenticated", "Sign in first, or say who you are.");
    const userId = who.person?.id ?? (await insertUser(tx, input.person ?? { name: "", email: "", password: "" }, who.now));
    const memberId = await join(tx, { outfitId: found.outfitId, userId, role: found.role }, who.now);
    await tx.insert(auditLog).values({
      outfitId: found.outfitId,
      id: newId(),
      at: who.now,
      memberId,
      action: "accept-invitation",
      subjectType: "invitation",
      subjectId: found.id,
      requestId: who.requestId,
    });
    return { slug: found.slug };
  });
}
