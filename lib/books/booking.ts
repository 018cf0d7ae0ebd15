import type { PLACES } from "@/db/words";
import type { DecimalString } from "@/lib/arithmetic/decimal";
import { add, isZero, sum } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import type { Account } from "./accounts";

export type Place = (typeof PLACES)[number];

/** One line of the weight book: into the place when positive, in the book unit. */
export type MovementLine = { place: Place; quantity: DecimalString; binId?: string; pickupId?: string; gradeId?: string };

/** One line of the money book: debit when positive, in minor units. */
export type Posting = {
  account: Account;
  amountMinor: number;
  gradeId?: string;
  yardId?: string;
  pickupId?: string;
  ticketId?: string;
  memberId?: string;
};

export type DocumentRef = { type: "pickup" | "weigh-in" | "count" | "ticket" | "payment" | "cost"; id: string };

/** What one event books: either side may be empty, never both. */
export type Booking = {
  kind: "pickup" | "weigh-in" | "count" | "ticket" | "payment" | "cost" | "work-out";
  on: string;
  document: DocumentRef;
  lines: MovementLine[];
  postings: Posting[];
  /** Ids of the movement and entry this booking takes back. */
  reverses?: { movementId?: string; entryId?: string };
};

/** Lines and postings that say nothing are left out of the books. */
export function withoutZeros(booking: Booking): Booking {
  return {
    ...booking,
    lines: booking.lines.filter((line) => !isZero(line.quantity)),
    postings: booking.postings.filter((posting) => posting.amountMinor !== 0),
  };
}

/** Throws when either side does not sum to zero: that is our bug, never the person's. */
export function assertBalanced(booking: Booking): void {
  const weight = sum(booking.lines.map((line) => line.quantity));
  if (!isZero(weight)) throw new RangeError(`movement of ${booking.kind} is off by ${weight}`);
  const money = addMinor(...booking.postings.map((posting) => posting.amountMinor));
  if (money !== 0) throw new RangeError(`entry of ${booking.kind} is off by ${money}`);
}

/** Sums quantities or amounts by a key, keeping the order of first appearance. */
export function totalsBy<T, V>(items: T[], key: (item: T) => string | undefined, value: (item: T) => V, plus: (a: V, b: V) => V): Map<string, V> {
  const totals = new Map<string, V>();
  for (const item of items) {
    const name = key(item);
    if (name === undefined) continue;
    const before = totals.get(name);
    totals.set(name, before === undefined ? value(item) : plus(before, value(item)));
  }
  return totals;
}

/** Change of each bin's balance. */
export const binChanges = (lines: MovementLine[]) =>
  totalsBy(
    lines,
    (line) => line.binId,
    (line) => line.quantity,
    add,
  );

/** Change of each lot's remaining weight. */
export const lotWeightChanges = (lines: MovementLine[]) =>
  totalsBy(
    lines,
    (line) => (line.place === "pile" ? line.pickupId : undefined),
    (line) => line.quantity,
    add,
  );

/** Change of what the outfit holds of each grade, over bins and loads. */
export const stockQuantityChanges = (lines: MovementLine[]) =>
  totalsBy(
    lines,
    (line) => (line.place === "bin" || line.place === "load" ? line.gradeId : undefined),
    (line) => line.quantity,
    add,
  );

/** Change of each grade's cost: scrap-stock postings that name a grade. */
export const stockCostChanges = (postings: Posting[]) =>
  totalsBy(
    postings,
    (p) => (p.account === "scrap-stock" ? p.gradeId : undefined),
    (p) => p.amountMinor,
    (a, b) => a + b,
  );

/** Change of each lot's remaining cost: scrap-stock postings that name a pickup and no grade. */
export const lotCostChanges = (postings: Posting[]) =>
  totalsBy(
    postings,
    (p) => (p.account === "scrap-stock" && p.gradeId === undefined ? p.pickupId : undefined),
    (p) => p.amountMinor,
    (a, b) => a + b,
  );
