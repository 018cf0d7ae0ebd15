import { and, eq } from "drizzle-orm";
import { expect } from "vitest";
import { database } from "@/db/client";
import { accountBalances, gradeStock, lots } from "@/db/schema";
import { isZero, trim } from "@/lib/arithmetic/decimal";
import { checkBooks } from "@/lib/books/always-true";

/** The balances of both books: accounts, lots and stock that are not zero. */
export async function booksOf(outfitId: string) {
  const db = database();
  const accounts = await db.select().from(accountBalances).where(eq(accountBalances.outfitId, outfitId));
  const pile = await db.select().from(lots).where(eq(lots.outfitId, outfitId));
  const stock = await db.select().from(gradeStock).where(eq(gradeStock.outfitId, outfitId));
  return {
    accounts: Object.fromEntries(accounts.filter((row) => row.balanceMinor !== 0).map((row) => [row.account, row.balanceMinor])),
    lots: pile
      .filter((row) => !isZero(row.remainingWeight) || row.remainingCostMinor !== 0)
      .map((row) => ({ pickupId: row.pickupId, weight: trim(row.remainingWeight), costMinor: row.remainingCostMinor })),
    stock: Object.fromEntries(
      stock
        .filter((row) => !isZero(row.quantity) || row.costMinor !== 0)
        .map((row) => [row.gradeId, { quantity: trim(row.quantity), costMinor: row.costMinor }]),
    ),
  };
}

/** What one pickup's lot holds. */
export async function lotOf(outfitId: string, pickupId: string) {
  const [row] = await database()
    .select()
    .from(lots)
    .where(and(eq(lots.outfitId, outfitId), eq(lots.pickupId, pickupId)));
  return row ? { weight: trim(row.remainingWeight), costMinor: row.remainingCostMinor } : null;
}

/** Fails when any rule of the always-true list is broken. */
export async function expectTrueBooks(outfitId: string): Promise<void> {
  expect((await checkBooks(database(), { outfitId })).filter((rule) => !rule.holds)).toEqual([]);
}
