import "server-only";
import { and, asc, eq, gt, isNull } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { apiKeys, invitations, memberships, movements, outfits, users } from "@/db/schema";
import type { Role } from "@/lib/auth/permissions";

/** The outfits a person belongs to, by name. */
export const outfitsOf = (db: Reader, { userId }: { userId: string }): Promise<{ slug: string; name: string; role: Role }[]> =>
  db
    .select({ slug: outfits.slug, name: outfits.name, role: memberships.role })
    .from(memberships)
    .innerJoin(outfits, eq(outfits.id, memberships.outfitId))
    .where(and(eq(memberships.userId, userId), isNull(memberships.removedAt)))
    .orderBy(asc(outfits.name), asc(outfits.slug));

const memberColumns = {
  id: memberships.id,
  userId: users.id,
  name: users.name,
  email: users.email,
  role: memberships.role,
  joinedAt: memberships.joinedAt,
  version: memberships.version,
};

/** The members of an outfit, in the order they joined. */
export const listMembers = (db: Reader, { outfitId }: { outfitId: string }) =>
  db
    .select(memberColumns)
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.outfitId, outfitId), isNull(memberships.removedAt)))
    .orderBy(asc(memberships.joinedAt), asc(memberships.id));

/** One standing member, or undefined. */
export async function getMember(db: Reader, { outfitId, id }: { outfitId: string; id: string }) {
  const [member] = await db
    .select(memberColumns)
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.outfitId, outfitId), eq(memberships.id, id), isNull(memberships.removedAt)));
  return member;
}

/** Invitations that still work, newest last. */
export const listInvitations = (db: Reader, { outfitId, now }: { outfitId: string; now: Date }) =>
  db
    .select({ id: invitations.id, role: invitations.role, note: invitations.note, createdAt: invitations.createdAt, expiresAt: invitations.expiresAt })
    .from(invitations)
    .where(and(eq(invitations.outfitId, outfitId), isNull(invitations.acceptedAt), isNull(invitations.revokedAt), gt(invitations.expiresAt, now)))
    .orderBy(asc(invitations.createdAt));

/** The invitation behind a link, with its outfit and who sent it; undefined when there is none. Whether it still works is for the caller. */
export async function invitationByHash(db: Reader, { tokenHash }: { tokenHash: string }) {
  const [found] = await db
    .select({
      id: invitations.id,
      outfitId: invitations.outfitId,
      outfitName: outfits.name,
      slug: outfits.slug,
      role: invitations.role,
      createdBy: invitations.createdBy,
      inviter: users.name,
      expiresAt: invitations.expiresAt,
      acceptedAt: invitations.acceptedAt,
      revokedAt: invitations.revokedAt,
    })
    .from(invitations)
    .innerJoin(outfits, eq(outfits.id, invitations.outfitId))
    .innerJoin(memberships, and(eq(memberships.outfitId, invitations.outfitId), eq(memberships.id, invitations.createdBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(invitations.tokenHash, tokenHash));
  return found;
}

/** API keys in use, oldest first. */
export const listApiKeys = (db: Reader, { outfitId }: { outfitId: string }) =>
  db
    .select({ id: apiKeys.id, name: apiKeys.name, role: apiKeys.role, prefix: apiKeys.prefix, createdAt: apiKeys.createdAt, lastUsedAt: apiKeys.lastUsedAt })
    .from(apiKeys)
    .where(and(eq(apiKeys.outfitId, outfitId), isNull(apiKeys.revokedAt)))
    .orderBy(asc(apiKeys.createdAt), asc(apiKeys.id));

/** Whether anything was ever booked: then currency, unit and time zone are fixed. */
export async function hasBooks(db: Reader, { outfitId }: { outfitId: string }): Promise<boolean> {
  const [any] = await db.select({ id: movements.id }).from(movements).where(eq(movements.outfitId, outfitId)).limit(1);
  return any !== undefined;
}
