import "server-only";
import { and, desc, eq, isNull, notExists } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import { entries, movementLines, movements, postings } from "@/db/schema";
import { add, isZero, negate } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import { stockCostChanges, stockQuantityChanges, type Booking, type DocumentRef, type MovementLine, type Posting } from "./booking";
import type { Account } from "./accounts";
import type { Books } from "./books";

type Head = { id: string; sequence: number; occurredOn: string; kind: string };

async function standingMovements(books: Books, document: DocumentRef): Promise<Head[]> {
  const later = alias(movements, "later");
  return books.tx
    .select({ id: movements.id, sequence: movements.sequence, occurredOn: movements.occurredOn, kind: movements.kind })
    .from(movements)
    .where(
      and(
        eq(movements.outfitId, books.ctx.outfit.id),
        eq(movements.documentType, document.type),
        eq(movements.documentId, document.id),
        isNull(movements.reversesId),
        notExists(
          books.tx
            .select({ id: later.id })
            .from(later)
            .where(and(eq(later.outfitId, movements.outfitId), eq(later.reversesId, movements.id))),
        ),
      ),
    )
    .orderBy(desc(movements.sequence));
}

async function standingEntries(books: Books, document: DocumentRef): Promise<Head[]> {
  const later = alias(entries, "later");
  return books.tx
    .select({ id: entries.id, sequence: entries.sequence, occurredOn: entries.occurredOn, kind: entries.kind })
    .from(entries)
    .where(
      and(
        eq(entries.outfitId, books.ctx.outfit.id),
        eq(entries.documentType, document.type),
        eq(entries.documentId, document.id),
        isNull(entries.reversesId),
        notExists(
          books.tx
            .select({ id: later.id })
            .from(later)
            .where(and(eq(later.outfitId, entries.outfitId), eq(later.reversesId, entries.id))),
        ),
      ),
    )
    .orderBy(desc(entries.sequence));
}

async function oppositeLines(books: Books, movementId: string): Promise<MovementLine[]> {
  const rows = await books.tx
    .select()
    .from(movementLines)
    .where(and(eq(movementLines.outfitId, books.ctx.outfit.id), eq(movementLines.movementId, movementId)));
  return rows.map((row) => ({
    place: row.place,
    quantity: negate(row.quantity),
    ...(row.binId ? { binId: row.binId } : {}),
    ...(row.pickupId ? { pickupId: row.pickupId } : {}),
    ...(row.gradeId ? { gradeId: row.gradeId } : {}),
  }));
}

async function oppositePostings(books: Books, entryId: string): Promise<Posting[]> {
  const rows = await books.tx
    .select()
    .from(postings)
    .where(and(eq(postings.outfitId, books.ctx.outfit.id), eq(postings.entryId, entryId)));
  return rows.map((row) => ({
    account: row.account as Account,
    amountMinor: -row.amountMinor,
    ...(row.gradeId ? { gradeId: row.gradeId } : {}),
    ...(row.yardId ? { yardId: row.yardId } : {}),
    ...(row.pickupId ? { pickupId: row.pickupId } : {}),
    ...(row.ticketId ? { ticketId: row.ticketId } : {}),
    ...(row.memberId ? { memberId: row.memberId } : {}),
  }));
}

/**
 * Taking back a receipt after part of it went out at the average can leave a grade with cost and no metal, or with less than no cost. The
 * difference was charged to what was sold too much or too little, so it goes back there.
 */
async function settlement(books: Books, lines: MovementLine[], opposite: Posting[]): Promise<Posting[]> {
  const quantities = stockQuantityChanges(lines);
  const costs = stockCostChanges(opposite);
  const gradeIds = [...new Set([...quantities.keys(), ...costs.keys()])];
  const before = await books.stock(gradeIds);
  return gradeIds.flatMap((gradeId): Posting[] => {
    const state = before.get(gradeId) ?? { quantity: "0", costMinor: 0 };
    const quantity = add(state.quantity, quantities.get(gradeId) ?? "0");
    const costMinor = addMinor(state.costMinor, costs.get(gradeId) ?? 0);
    if (costMinor === 0 || (costMinor > 0 && !isZero(quantity))) return [];
    return [
      { account: "scrap-stock", amountMinor: -costMinor, gradeId },
      { account: "cost-of-scrap-sold", amountMinor: costMinor, gradeId },
    ];
  });
}

type Pair = { movement?: Head; entry?: Head };

/** The records that one booking made, newest first: its movement took a number of the sequence and its entry the next. */
function bookingsOf(movementHeads: Head[], entryHeads: Head[]): Pair[] {
  const unpaired = new Map(entryHeads.map((entry) => [entry.sequence, entry]));
  const pairs: Pair[] = movementHeads.map((movement) => {
    const entry = unpaired.get(movement.sequence + 1);
    if (!entry || entry.kind !== movement.kind || entry.occurredOn !== movement.occurredOn) return { movement };
    unpaired.delete(entry.sequence);
    return { movement, entry };
  });
  const all: Pair[] = [...pairs, ...[...unpaired.values()].map((entry) => ({ entry }))];
  const sequenceOf = ({ movement, entry }: Pair) => (movement ?? entry)?.sequence ?? 0;
  return all.sort((a, b) => sequenceOf(b) - sequenceOf(a));
}

/**
 * Takes back everything that stands in both books for a document (or only its bookings of one kind), newest first, each by an opposite
 * record that points at it. Dated like the original, or in the first open month when the original's is closed. Throws `books-refuse` when a
 * bin would go below zero.
 */
export async function reverseDocument(books: Books, document: DocumentRef, { kind }: { kind?: Booking["kind"] } = {}): Promise<void> {
  const wanted = (head: Head) => kind === undefined || head.kind === kind;
  const movementHeads = (await standingMovements(books, document)).filter(wanted);
  const entryHeads = (await standingEntries(books, document)).filter(wanted);
  for (const { movement, entry } of bookingsOf(movementHeads, entryHeads)) {
    const head = movement ?? entry;
    if (!head) continue;
    const lines = movement ? await oppositeLines(books, movement.id) : [];
    const opposite = entry ? await oppositePostings(books, entry.id) : [];
    await books.post({
      kind: head.kind as Booking["kind"],
      on: await books.correctionDay(head.occurredOn),
      document,
      lines,
      postings: [...opposite, ...(await settlement(books, lines, opposite))],
      reverses: { ...(movement ? { movementId: movement.id } : {}), ...(entry ? { entryId: entry.id } : {}) },
    });
  }
}
