import "server-only";
import { and, eq } from "drizzle-orm";
import { database, type Reader } from "@/db/client";
import { costs, months } from "@/db/schema";
import type { Transaction } from "@/db/transaction";
import type { Context } from "@/lib/auth/context";
import { actsOnAll } from "@/lib/auth/permissions";
import { checkBooks } from "@/lib/books/always-true";
import { openBooks } from "@/lib/books/books";
import { reverseDocument } from "@/lib/books/reverse";
import { audit, transact } from "@/lib/books/transact";
import { monthOf } from "@/lib/clock";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { monthField } from "@/lib/http/fields";
import { newId } from "@/lib/ids";
import { listEntries, listMovements } from "./book-queries";
import { earningsOfMonth, getCost, getMonth, listCosts } from "./queries";
import { costPostings } from "./rules";
import type { Cost, CostInput, CostListQuery, EntryListQuery, Month, MovementListQuery } from "./schema";

/** Whose costs a member sees: null for everybody's, else only their own. */
const ownOf = (ctx: Context): string | null => (actsOnAll(ctx.actor.role) ? null : ctx.actor.memberId);

async function requireCost(db: Reader, ctx: Context, id: string): Promise<Cost> {
  const cost = await getCost(db, { outfitId: ctx.outfit.id, id, ownOf: ownOf(ctx) });
  if (!cost) throw notFound("cost");
  return cost;
}

/** A page of the costs this member sees, newest first. */
export const seeCosts = (ctx: Context, query: CostListQuery) => listCosts(database(), { outfitId: ctx.outfit.id, ownOf: ownOf(ctx), ...query });

/** Records money spent and books it. Throws `input` for a day that lies ahead, `books-refuse` for a day in a closed month. */
export async function addCost(ctx: Context, input: CostInput): Promise<Cost> {
  if (input.spentOn > ctx.today) throw fieldError("spentOn", "Date must be today or earlier.");
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const id = input.id ?? newId();
    await tx.insert(costs).values({
      outfitId: ctx.outfit.id,
      id,
      spentOn: input.spentOn,
      kind: input.kind,
      amountMinor: input.amountMinor,
      paidFrom: input.paidFrom,
      note: input.note ?? null,
      madeBy: ctx.actor.memberId,
      madeAt: ctx.now,
    });
    await books.post({ kind: "cost", on: input.spentOn, document: { type: "cost", id }, lines: [], postings: costPostings(input, ctx.actor.memberId) });
    await audit(tx, ctx, "add-cost", { type: "cost", id });
    return requireCost(tx, ctx, id);
  });
}

/** Takes a cost back out of the money book. Throws `not-found` (also for another's cost, where only own ones are seen), `conflict` when it is void already. */
export async function voidCost(ctx: Context, id: string): Promise<Cost> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const cost = await requireCost(tx, ctx, id);
    if (cost.voidedAt !== null) throw new AppError("conflict", "This cost is void already.");
    await reverseDocument(books, { type: "cost", id });
    await tx
      .update(costs)
      .set({ voidedAt: ctx.now, voidedBy: ctx.actor.memberId, version: cost.version + 1 })
      .where(and(eq(costs.outfitId, ctx.outfit.id), eq(costs.id, id)));
    await audit(tx, ctx, "void-cost", { type: "cost", id });
    return requireCost(tx, ctx, id);
  });
}

/** The review of a month. */
export const seeEarnings = (ctx: Context, { month }: { month: string }) =>
  earningsOfMonth(database(), { outfitId: ctx.outfit.id, month, exponent: ctx.outfit.exponent });

/** A page of the money book, newest first. */
export const seeEntries = (ctx: Context, query: EntryListQuery) => listEntries(database(), { outfitId: ctx.outfit.id, ...query });

/** A page of the weight book, newest first. */
export const seeMovements = (ctx: Context, query: MovementListQuery) => listMovements(database(), { outfitId: ctx.outfit.id, ...query });

/** The always-true list against this outfit's books. */
export async function seeBooksCheck(ctx: Context) {
  const items = await checkBooks(database(), { outfitId: ctx.outfit.id });
  return { items, holds: items.every((item) => item.holds) };
}

function requireMonth(text: string): string {
  const parsed = monthField.safeParse(text);
  if (!parsed.success) throw fieldError("month", "Month must be like 2026-03.");
  return parsed.data;
}

async function setMonth(tx: Transaction, ctx: Context, month: string, change: Partial<typeof months.$inferInsert>): Promise<void> {
  await tx
    .insert(months)
    .values({ outfitId: ctx.outfit.id, month, ...change })
    .onDuplicateKeyUpdate({ set: change });
}

/**
 * Locks every posting dated in a month. Throws `input` for what is no month, `books-refuse` for a month that has not ended, `conflict` when it is
 * closed already.
 */
export async function closeMonth(ctx: Context, text: string): Promise<Month> {
  const month = requireMonth(text);
  if (month >= monthOf(ctx.today)) throw new AppError("books-refuse", `${month} has not ended. Close it after its last day.`);
  return transact(ctx, async (tx) => {
    await openBooks(tx, ctx);
    const state = await getMonth(tx, { outfitId: ctx.outfit.id, month });
    if (state.closedAt !== null) throw new AppError("conflict", `${month} is closed already.`);
    await setMonth(tx, ctx, month, { closedAt: ctx.now, closedBy: ctx.actor.memberId });
    await audit(tx, ctx, "close-month", { type: "month", id: month });
    return getMonth(tx, { outfitId: ctx.outfit.id, month });
  });
}

/** Opens a closed month again, which stays on record. Throws `input` for what is no month, `conflict` when it is open. */
export async function reopenMonth(ctx: Context, text: string): Promise<Month> {
  const month = requireMonth(text);
  return transact(ctx, async (tx) => {
    await openBooks(tx, ctx);
    const state = await getMonth(tx, { outfitId: ctx.outfit.id, month });
    if (state.closedAt === null) throw new AppError("conflict", `${month} is open.`);
    await setMonth(tx, ctx, month, { closedAt: null, closedBy: null, reopenedAt: ctx.now, reopenedBy: ctx.actor.memberId });
    await audit(tx, ctx, "reopen-month", { type: "month", id: month });
    return getMonth(tx, { outfitId: ctx.outfit.id, month });
  });
}
