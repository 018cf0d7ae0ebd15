import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { counts } from "@/db/schema";
import { isNegative, isZero, subtract } from "@/lib/arithmetic/decimal";
import { netWeight } from "@/lib/arithmetic/weight";
import type { Context } from "@/lib/auth/context";
import { openBooks } from "@/lib/books/books";
import { reverseDocument } from "@/lib/books/reverse";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { newId } from "@/lib/ids";
import { requireBinInUse } from "./in-use";
import { getCount, listCounts } from "./queries";
import { countBooking } from "./rules";
import type { Count, CountInput, CountListQuery } from "./schema";

/** A page of counts, newest first. */
export const seeCounts = (ctx: Context, query: CountListQuery) => listCounts(database(), { outfitId: ctx.outfit.id, ...query });

/** One count. Throws `not-found`. */
export const seeCount = (ctx: Context, id: string): Promise<Count> => requireCount(database(), ctx, id);

async function requireCount(db: Parameters<typeof getCount>[0], ctx: Context, id: string): Promise<Count> {
  const found = await getCount(db, { outfitId: ctx.outfit.id, id });
  if (!found) throw notFound("count");
  return found;
}

/**
 * Weighs a bin to correct the book: the difference goes to or comes from variance, at the moving average. A count that agrees is kept and books
 * nothing. Throws `input` for tare over gross or a day that lies ahead, `conflict` for a bin put away.
 */
export async function countBin(ctx: Context, input: CountInput): Promise<Count> {
  if (input.countedOn > ctx.today) throw fieldError("countedOn", "Date must be today or earlier.");
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const bin = await requireBinInUse(books, input.binId);
    const tare = input.tare ?? bin.tare;
    const net = netWeight({ gross: input.gross, tare });
    if (isNegative(net))
      throw fieldError(input.tare === undefined ? "gross" : "tare", `Tare ${tare} is more than gross. Weigh again, or look at the bin's tare.`);
    const difference = subtract(net, bin.balance);
    const id = input.id ?? newId();
    await tx.insert(counts).values({
      outfitId: ctx.outfit.id,
      id,
      binId: bin.id,
      gradeId: bin.gradeId,
      countedOn: input.countedOn,
      gross: input.gross,
      tare,
      net,
      bookQuantity: bin.balance,
      difference,
      note: input.note ?? null,
      madeBy: ctx.actor.memberId,
      madeAt: ctx.now,
    });
    await books.requireOpen(input.countedOn);
    if (!isZero(difference)) {
      const stock = (await books.stock([bin.gradeId])).get(bin.gradeId) ?? { quantity: "0", costMinor: 0 };
      await books.post({
        kind: "count",
        on: input.countedOn,
        document: { type: "count", id },
        ...countBooking({ binId: bin.id, gradeId: bin.gradeId, difference, stock }),
      });
    }
    await audit(tx, ctx, "count-bin", { type: "count", id });
    return requireCount(tx, ctx, id);
  });
}

/** Takes a count back out of both books. Throws `forbidden` for somebody else's, `conflict` when it is void already. */
export async function voidCount(ctx: Context, id: string): Promise<Count> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const found = await requireCount(tx, ctx, id);
    if (ctx.actor.role !== "owner" && found.madeBy.id !== ctx.actor.memberId) {
      throw new AppError("forbidden", `${found.madeBy.name} counted this bin. Only they or the owner take it back.`);
    }
    if (found.voidedAt !== null) throw new AppError("conflict", "This count is void already.");
    await tx
      .update(counts)
      .set({ voidedAt: ctx.now, voidedBy: ctx.actor.memberId })
      .where(and(eq(counts.outfitId, ctx.outfit.id), eq(counts.id, id)));
    await reverseDocument(books, { type: "count", id });
    await audit(tx, ctx, "void-count", { type: "count", id });
    return requireCount(tx, ctx, id);
  });
}
