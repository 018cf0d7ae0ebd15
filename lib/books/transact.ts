import "server-only";
import { and, eq } from "drizzle-orm";
import { auditLog, idempotencyKeys } from "@/db/schema";
import { inTransaction, isDuplicateKey, type Transaction } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import { AppError } from "@/lib/http/errors";
import { newId } from "@/lib/ids";

/** Unwinds the transaction that lost the race for an idempotency key. */
class AnsweredBefore extends Error {}

async function storedAnswer<T>(tx: Transaction, ctx: Context, keyHash: string, fingerprint: string): Promise<T> {
  const [stored] = await tx
    .select({ fingerprint: idempotencyKeys.fingerprint, answer: idempotencyKeys.answer })
    .from(idempotencyKeys)
    .where(and(eq(idempotencyKeys.outfitId, ctx.outfit.id), eq(idempotencyKeys.keyHash, keyHash)));
  if (!stored?.answer) throw new AppError("conflict", "The first request with this key is still running. Send it again in a moment.");
  if (stored.fingerprint !== fingerprint) {
    throw new AppError("key-reused", "This Idempotency-Key was used for another request. Take a new key for new work.");
  }
  return JSON.parse(stored.answer) as T;
}

/**
 * Runs one use case in one transaction. With an idempotency key the answer is stored in that same transaction: the same request sent
 * again gets it back and nothing runs twice. The answer must survive JSON.
 */
export async function transact<T>(ctx: Context, work: (tx: Transaction) => Promise<T>): Promise<T> {
  const claim = ctx.idempotency;
  if (!claim) return inTransaction(work);
  const where = and(eq(idempotencyKeys.outfitId, ctx.outfit.id), eq(idempotencyKeys.keyHash, claim.keyHash));
  try {
    return await inTransaction(async (tx) => {
      try {
        await tx.insert(idempotencyKeys).values({ outfitId: ctx.outfit.id, ...claim, answer: null, createdAt: ctx.now });
      } catch (error) {
        if (isDuplicateKey(error)) throw new AnsweredBefore();
        throw error;
      }
      const answer = await work(tx);
      await tx
        .update(idempotencyKeys)
        .set({ answer: JSON.stringify(answer) })
        .where(where);
      return answer;
    });
  } catch (error) {
    if (!(error instanceof AnsweredBefore)) throw error;
    ctx.replayed = true;
    return inTransaction((tx) => storedAnswer<T>(tx, ctx, claim.keyHash, claim.fingerprint));
  }
}

/** Writes who did what, in the transaction that did it. `action` is verb-noun, like the use case. */
export async function audit(
  tx: Transaction,
  ctx: Context,
  action: string,
  subject: { type: string; id: string },
  detail: Record<string, unknown> | null = null,
): Promise<void> {
  await tx.insert(auditLog).values({
    outfitId: ctx.outfit.id,
    id: newId(),
    at: ctx.now,
    memberId: ctx.actor.memberId,
    apiKeyId: ctx.actor.apiKeyId,
    action,
    subjectType: subject.type,
    subjectId: subject.id,
    requestId: ctx.requestId,
    detail,
  });
}
