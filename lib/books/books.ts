import "server-only";
import { and, eq, inArray, sql } from "drizzle-orm";
import {
  accountBalances,
  accountMonths,
  binBalances,
  bins,
  bookState,
  entries,
  gradeStock,
  lots,
  months,
  movementLines,
  movements,
  postings,
} from "@/db/schema";
import type { Transaction } from "@/db/transaction";
import { add, isNegative, isZero, negate, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import type { StockState } from "@/lib/arithmetic/average";
import { addMinor } from "@/lib/arithmetic/money";
import type { Context } from "@/lib/auth/context";
import { monthOf, shiftMonth } from "@/lib/clock";
import { AppError, notFound } from "@/lib/http/errors";
import { newId } from "@/lib/ids";
import {
  assertBalanced,
  binChanges,
  lotCostChanges,
  lotWeightChanges,
  stockCostChanges,
  stockQuantityChanges,
  totalsBy,
  withoutZeros,
  type Booking,
} from "./booking";

export type LotState = { remainingWeight: DecimalString; remainingCostMinor: number };
export type BinState = { quantity: DecimalString; heldSince: string | null };

/**
 * The books of one outfit, locked. There is no other way to write a movement or an entry: `openBooks` takes the outfit's lock first, so
 * whatever is read here stays true until the transaction ends, and every balance changes together with its lines.
 */
export class Books {
  private readonly outfitId: string;

  constructor(
    readonly tx: Transaction,
    readonly ctx: Context,
    private sequence: number,
    private pickupNumber: number,
  ) {
    this.outfitId = ctx.outfit.id;
  }

  /** The next running number of a pickup. */
  async takePickupNumber(): Promise<number> {
    const taken = this.pickupNumber;
    this.pickupNumber += 1;
    await this.tx.update(bookState).set({ nextPickupNumber: this.pickupNumber }).where(eq(bookState.outfitId, this.outfitId));
    return taken;
  }

  /** Q and C of each grade; a grade never held is zero. */
  async stock(gradeIds: string[]): Promise<Map<string, StockState>> {
    const found = new Map<string, StockState>(gradeIds.map((gradeId) => [gradeId, { quantity: "0", costMinor: 0 }]));
    if (gradeIds.length === 0) return found;
    const rows = await this.tx
      .select()
      .from(gradeStock)
      .where(and(eq(gradeStock.outfitId, this.outfitId), inArray(gradeStock.gradeId, gradeIds)));
    for (const row of rows) found.set(row.gradeId, { quantity: row.quantity, costMinor: row.costMinor });
    return found;
  }

  /** What each bin holds; a bin never filled holds zero. */
  async bins(binIds: string[]): Promise<Map<string, BinState>> {
    const found = new Map<string, BinState>(binIds.map((binId) => [binId, { quantity: "0", heldSince: null }]));
    if (binIds.length === 0) return found;
    const rows = await this.tx
      .select()
      .from(binBalances)
      .where(and(eq(binBalances.outfitId, this.outfitId), inArray(binBalances.binId, binIds)));
    for (const row of rows) found.set(row.binId, { quantity: row.quantity, heldSince: row.heldSince });
    return found;
  }

  /** What is left of each pickup's lot. A pickup without one is not this outfit's. */
  async lots(pickupIds: string[]): Promise<Map<string, LotState>> {
    if (pickupIds.length === 0) return new Map();
    const rows = await this.tx
      .select()
      .from(lots)
      .where(and(eq(lots.outfitId, this.outfitId), inArray(lots.pickupId, pickupIds)));
    return new Map(rows.map((row) => [row.pickupId, { remainingWeight: row.remainingWeight, remainingCostMinor: row.remainingCostMinor }]));
  }

  /** Refuses a date in a closed month. */
  async requireOpen(on: string): Promise<void> {
    if (await this.isClosed(monthOf(on))) {
      throw new AppError("books-refuse", `${monthOf(on)} is closed. Date it in an open month, or ask the owner to reopen that month.`);
    }
  }

  private async isClosed(month: string): Promise<boolean> {
    const [row] = await this.tx
      .select({ closedAt: months.closedAt })
      .from(months)
      .where(and(eq(months.outfitId, this.outfitId), eq(months.month, month)));
    return row?.closedAt != null;
  }

  /** The day a correction of something dated `on` is booked: the same day, or, when its month is closed, the first day that is open. */
  async correctionDay(on: string): Promise<string> {
    let month = monthOf(on);
    if (!(await this.isClosed(month))) return on;
    while (await this.isClosed(month)) month = shiftMonth(month, 1);
    return month === monthOf(this.ctx.today) ? this.ctx.today : `${month}-01`;
  }

  /** Writes a booking into both books and moves every balance it touches. */
  async post(booking: Booking): Promise<void> {
    const clean = withoutZeros(booking);
    assertBalanced(clean);
    await this.requireOpen(clean.on);
    if (clean.lines.length > 0) await this.writeMovement(clean);
    if (clean.postings.length > 0) await this.writeEntry(clean);
    await this.tx.update(bookState).set({ nextSequence: this.sequence }).where(eq(bookState.outfitId, this.outfitId));
    await this.moveBins(clean);
    await this.moveLots(clean);
    await this.moveStock(clean);
    await this.moveAccounts(clean);
  }

  private head(booking: Booking) {
    const sequence = this.sequence;
    this.sequence += 1;
    const { type, id } = booking.document;
    return {
      outfitId: this.outfitId,
      id: newId(),
      sequence,
      occurredOn: booking.on,
      kind: booking.kind,
      documentType: type,
      documentId: id,
      madeBy: this.ctx.actor.memberId,
      madeAt: this.ctx.now,
    };
  }

  private async writeMovement(booking: Booking): Promise<void> {
    const head = this.head(booking);
    await this.tx.insert(movements).values({ ...head, reversesId: booking.reverses?.movementId ?? null });
    await this.tx
      .insert(movementLines)
      .values(booking.lines.map((line, index) => ({ outfitId: this.outfitId, movementId: head.id, line: index + 1, occurredOn: booking.on, ...line })));
  }

  private async writeEntry(booking: Booking): Promise<void> {
    const head = this.head(booking);
    await this.tx.insert(entries).values({ ...head, reversesId: booking.reverses?.entryId ?? null });
    await this.tx
      .insert(postings)
      .values(booking.postings.map((posting, index) => ({ outfitId: this.outfitId, entryId: head.id, line: index + 1, occurredOn: booking.on, ...posting })));
  }

  private async moveBins(booking: Booking): Promise<void> {
    const changes = binChanges(booking.lines);
    if (changes.size === 0) return;
    const before = await this.bins([...changes.keys()]);
    const rows = [...changes].map(([binId, change]) => {
      const state = before.get(binId) ?? { quantity: "0", heldSince: null };
      const quantity = add(state.quantity, change);
      const wasEmpty = isZero(state.quantity);
      return { outfitId: this.outfitId, binId, quantity, heldSince: isZero(quantity) ? null : wasEmpty ? booking.on : state.heldSince };
    });
    const short = rows.find((row) => isNegative(row.quantity));
    if (short) throw await this.binWouldGoBelowZero(short.binId, negate(short.quantity));
    await this.tx
      .insert(binBalances)
      .values(rows)
      .onDuplicateKeyUpdate({ set: { quantity: sql`values(quantity)`, heldSince: sql`values(held_since)` } });
  }

  private async binWouldGoBelowZero(binId: string, missing: DecimalString): Promise<AppError> {
    const [bin] = await this.tx
      .select({ label: bins.label })
      .from(bins)
      .where(and(eq(bins.outfitId, this.outfitId), eq(bins.id, binId)));
    const label = bin?.label ?? "The bin";
    return new AppError("books-refuse", `${label} would go ${trim(missing)} ${this.ctx.outfit.weightUnit} below zero. Count the bin first, then try again.`);
  }

  private async moveLots(booking: Booking): Promise<void> {
    const weights = lotWeightChanges(booking.lines);
    const costs = lotCostChanges(booking.postings);
    const pickupIds = [...new Set([...weights.keys(), ...costs.keys()])];
    if (pickupIds.length === 0) return;
    const before = await this.lots(pickupIds);
    const rows = pickupIds.map((pickupId) => {
      const state = before.get(pickupId) ?? { remainingWeight: "0", remainingCostMinor: 0 };
      return {
        outfitId: this.outfitId,
        pickupId,
        remainingWeight: add(state.remainingWeight, weights.get(pickupId) ?? "0"),
        remainingCostMinor: addMinor(state.remainingCostMinor, costs.get(pickupId) ?? 0),
      };
    });
    await this.tx
      .insert(lots)
      .values(rows)
      .onDuplicateKeyUpdate({ set: { remainingWeight: sql`values(remaining_weight)`, remainingCostMinor: sql`values(remaining_cost_minor)` } });
  }

  private async moveStock(booking: Booking): Promise<void> {
    const quantities = stockQuantityChanges(booking.lines);
    const costs = stockCostChanges(booking.postings);
    const gradeIds = [...new Set([...quantities.keys(), ...costs.keys()])];
    if (gradeIds.length === 0) return;
    const before = await this.stock(gradeIds);
    const rows = gradeIds.map((gradeId) => {
      const state = before.get(gradeId) ?? { quantity: "0", costMinor: 0 };
      return {
        outfitId: this.outfitId,
        gradeId,
        quantity: add(state.quantity, quantities.get(gradeId) ?? "0"),
        costMinor: addMinor(state.costMinor, costs.get(gradeId) ?? 0),
      };
    });
    await this.tx
      .insert(gradeStock)
      .values(rows)
      .onDuplicateKeyUpdate({ set: { quantity: sql`values(quantity)`, costMinor: sql`values(cost_minor)` } });
  }

  private async moveAccounts(booking: Booking): Promise<void> {
    const changes = totalsBy(
      booking.postings,
      (p) => p.account,
      (p) => p.amountMinor,
      (a, b) => a + b,
    );
    if (changes.size === 0) return;
    // Sorted, so that all writers touch the accounts in one order.
    const sorted = [...changes].sort(([a], [b]) => (a < b ? -1 : 1));
    await this.tx
      .insert(accountBalances)
      .values(sorted.map(([account, balanceMinor]) => ({ outfitId: this.outfitId, account, balanceMinor })))
      .onDuplicateKeyUpdate({ set: { balanceMinor: sql`balance_minor + values(balance_minor)` } });
    await this.tx
      .insert(accountMonths)
      .values(sorted.map(([account, amountMinor]) => ({ outfitId: this.outfitId, month: monthOf(booking.on), account, amountMinor })))
      .onDuplicateKeyUpdate({ set: { amountMinor: sql`amount_minor + values(amount_minor)` } });
  }
}

/** Takes the outfit's lock and opens its books for this transaction. The first thing every booking does. */
export async function openBooks(tx: Transaction, ctx: Context): Promise<Books> {
  const [state] = await tx.select().from(bookState).where(eq(bookState.outfitId, ctx.outfit.id)).for("update");
  if (!state) throw notFound("outfit");
  return new Books(tx, ctx, state.nextSequence, state.nextPickupNumber);
}
