import "server-only";
import { and, asc, desc, eq, gte, inArray, lt, lte, or, sql, type SQL } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { accounts, bins, entries, grades, memberships, movementLines, movements, pickups, postings, tickets, users, yards } from "@/db/schema";
import { trim, type DecimalString } from "@/lib/arithmetic/decimal";
import { isRealDate, monthBounds } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, encodeCursor, type Cursor } from "@/lib/http/page";
import { minorOf } from "./queries";
import type { Entry, EntryListQuery, Movement, MovementListQuery } from "./schema";

type Days = { from?: string | undefined; to?: string | undefined; month?: string | undefined };

/** First and last day that a filter lets through; null where it sets no bound. */
function daysOf({ from, to, month }: Days): { first: string | null; last: string | null } {
  const bounds = month === undefined ? null : monthBounds(month);
  const first = [from, bounds?.first]
    .filter((day) => day !== undefined)
    .sort()
    .at(-1);
  const last = [to, bounds?.last]
    .filter((day) => day !== undefined)
    .sort()
    .at(0);
  return { first: first ?? null, last: last ?? null };
}

/** Where a page of a book starts: after that day and number of the running order. */
function startOf(cursor: string | undefined): (Cursor & { sequence: number }) | null {
  const after = decodeCursor(cursor);
  if (!after) return null;
  if (!isRealDate(after.at) || !/^\d{1,9}$/.test(after.id)) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  return { ...after, sequence: Number.parseInt(after.id, 10) };
}

type Head = { id: string; sequence: number; occurredOn: string; madeAt: Date; makerId: string; makerName: string };

function pageOfHeads<T extends Head>(rows: T[], limit: number) {
  const heads = rows.slice(0, limit);
  const last = heads.at(-1);
  return { heads, nextCursor: rows.length > limit && last ? encodeCursor({ at: last.occurredOn, id: String(last.sequence) }) : null };
}

const recordOf = <T extends Head>({ makerId, makerName, madeAt, ...row }: T) => ({
  ...row,
  madeBy: { id: makerId, name: makerName },
  madeAt: madeAt.toISOString(),
});

/** The columns of either book's heads. */
const headOf = (book: typeof entries | typeof movements) => ({
  id: book.id,
  sequence: book.sequence,
  occurredOn: book.occurredOn,
  kind: book.kind,
  documentType: book.documentType,
  documentId: book.documentId,
  reversesId: book.reversesId,
  makerId: book.madeBy,
  makerName: users.name,
  madeAt: book.madeAt,
});

function headFilter(book: typeof entries | typeof movements, { outfitId, ...query }: { outfitId: string } & Omit<EntryListQuery, "account">): SQL | undefined {
  const { first, last } = daysOf(query);
  const after = startOf(query.cursor);
  return and(
    eq(book.outfitId, outfitId),
    first === null ? undefined : gte(book.occurredOn, first),
    last === null ? undefined : lte(book.occurredOn, last),
    query.documentType ? eq(book.documentType, query.documentType) : undefined,
    query.documentId ? eq(book.documentId, query.documentId) : undefined,
    after ? and(lte(book.occurredOn, after.at), or(lt(book.occurredOn, after.at), lt(book.sequence, after.sequence))) : undefined,
  );
}

/** The postings that fit a filter; undefined when it says nothing of postings. */
function postingFilter({ outfitId, ...query }: { outfitId: string } & EntryListQuery): SQL | undefined {
  const asked = [
    query.account ? eq(postings.account, query.account) : undefined,
    query.gradeId ? eq(postings.gradeId, query.gradeId) : undefined,
    query.yardId ? eq(postings.yardId, query.yardId) : undefined,
    query.pickupId ? eq(postings.pickupId, query.pickupId) : undefined,
    query.ticketId ? eq(postings.ticketId, query.ticketId) : undefined,
  ].filter((part) => part !== undefined);
  if (asked.length === 0) return undefined;
  const { first, last } = daysOf(query);
  return and(
    eq(postings.outfitId, outfitId),
    ...asked,
    first === null ? undefined : gte(postings.occurredOn, first),
    last === null ? undefined : lte(postings.occurredOn, last),
  );
}

async function postingsOf(db: Reader, { outfitId, entryIds }: { outfitId: string; entryIds: string[] }) {
  if (entryIds.length === 0) return [];
  return db
    .select({
      entryId: postings.entryId,
      line: postings.line,
      account: postings.account,
      accountName: accounts.name,
      amountMinor: postings.amountMinor,
      gradeId: postings.gradeId,
      gradeName: grades.name,
      yardId: postings.yardId,
      yardName: yards.name,
      pickupId: postings.pickupId,
      pickupNumber: pickups.number,
      ticketId: postings.ticketId,
      ticketNumber: tickets.number,
      memberId: postings.memberId,
      memberName: users.name,
    })
    .from(postings)
    .innerJoin(accounts, and(eq(accounts.outfitId, postings.outfitId), eq(accounts.code, postings.account)))
    .leftJoin(grades, and(eq(grades.outfitId, postings.outfitId), eq(grades.id, postings.gradeId)))
    .leftJoin(yards, and(eq(yards.outfitId, postings.outfitId), eq(yards.id, postings.yardId)))
    .leftJoin(pickups, and(eq(pickups.outfitId, postings.outfitId), eq(pickups.id, postings.pickupId)))
    .leftJoin(tickets, and(eq(tickets.outfitId, postings.outfitId), eq(tickets.id, postings.ticketId)))
    .leftJoin(memberships, and(eq(memberships.outfitId, postings.outfitId), eq(memberships.id, postings.memberId)))
    .leftJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(postings.outfitId, outfitId), inArray(postings.entryId, entryIds)))
    .orderBy(asc(postings.entryId), asc(postings.line));
}

/** Rows by the id of the record they belong to. */
function byRecord<T>(rows: T[], key: (row: T) => string): Map<string, T[]> {
  const grouped = new Map<string, T[]>();
  for (const row of rows) grouped.set(key(row), [...(grouped.get(key(row)) ?? []), row]);
  return grouped;
}

/** A page of the money book, newest first, with all postings of each entry. Two queries. */
export async function listEntries(db: Reader, query: { outfitId: string } & EntryListQuery): Promise<{ items: Entry[]; nextCursor: string | null }> {
  const { outfitId, limit } = query;
  const fits = postingFilter(query);
  const rows = await db
    .select(headOf(entries))
    .from(entries)
    .innerJoin(memberships, and(eq(memberships.outfitId, entries.outfitId), eq(memberships.id, entries.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(headFilter(entries, query), fits ? inArray(entries.id, db.select({ id: postings.entryId }).from(postings).where(fits)) : undefined))
    .orderBy(desc(entries.occurredOn), desc(entries.sequence))
    .limit(limit + 1);
  const { heads, nextCursor } = pageOfHeads(rows, limit);
  const lines = byRecord(await postingsOf(db, { outfitId, entryIds: heads.map((head) => head.id) }), (row) => row.entryId);
  return {
    items: heads.map((head) => ({ ...recordOf(head), postings: (lines.get(head.id) ?? []).map(({ entryId: _entryId, ...line }) => line) })),
    nextCursor,
  };
}

/** What the postings that fit a filter come to, debit when positive; null when the filter says nothing of postings. */
export async function totalOfPostings(db: Reader, query: { outfitId: string } & EntryListQuery): Promise<number | null> {
  const fits = postingFilter(query);
  if (!fits || query.documentType !== undefined) return null;
  const [row] = await db
    .select({ total: sql<number>`coalesce(sum(${postings.amountMinor}), 0)`.mapWith(minorOf) })
    .from(postings)
    .where(fits);
  return row?.total ?? 0;
}

function lineFilter({ outfitId, ...query }: { outfitId: string } & MovementListQuery): SQL | undefined {
  const asked = [
    query.place ? eq(movementLines.place, query.place) : undefined,
    query.gradeId ? eq(movementLines.gradeId, query.gradeId) : undefined,
    query.binId ? eq(movementLines.binId, query.binId) : undefined,
    query.pickupId ? eq(movementLines.pickupId, query.pickupId) : undefined,
  ].filter((part) => part !== undefined);
  if (asked.length === 0) return undefined;
  const { first, last } = daysOf(query);
  return and(
    eq(movementLines.outfitId, outfitId),
    ...asked,
    first === null ? undefined : gte(movementLines.occurredOn, first),
    last === null ? undefined : lte(movementLines.occurredOn, last),
  );
}

async function linesOf(db: Reader, { outfitId, movementIds }: { outfitId: string; movementIds: string[] }) {
  if (movementIds.length === 0) return [];
  const rows = await db
    .select({
      movementId: movementLines.movementId,
      line: movementLines.line,
      place: movementLines.place,
      quantity: movementLines.quantity,
      binId: movementLines.binId,
      binLabel: bins.label,
      gradeId: movementLines.gradeId,
      gradeName: grades.name,
      pickupId: movementLines.pickupId,
      pickupNumber: pickups.number,
    })
    .from(movementLines)
    .leftJoin(bins, and(eq(bins.outfitId, movementLines.outfitId), eq(bins.id, movementLines.binId)))
    .leftJoin(grades, and(eq(grades.outfitId, movementLines.outfitId), eq(grades.id, movementLines.gradeId)))
    .leftJoin(pickups, and(eq(pickups.outfitId, movementLines.outfitId), eq(pickups.id, movementLines.pickupId)))
    .where(and(eq(movementLines.outfitId, outfitId), inArray(movementLines.movementId, movementIds)))
    .orderBy(asc(movementLines.movementId), asc(movementLines.line));
  return rows.map((row) => ({ ...row, quantity: trim(row.quantity) }));
}

/** A page of the weight book, newest first, with all lines of each movement. Two queries. */
export async function listMovements(db: Reader, query: { outfitId: string } & MovementListQuery): Promise<{ items: Movement[]; nextCursor: string | null }> {
  const { outfitId, limit } = query;
  const fits = lineFilter(query);
  const rows = await db
    .select(headOf(movements))
    .from(movements)
    .innerJoin(memberships, and(eq(memberships.outfitId, movements.outfitId), eq(memberships.id, movements.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(
      and(headFilter(movements, query), fits ? inArray(movements.id, db.select({ id: movementLines.movementId }).from(movementLines).where(fits)) : undefined),
    )
    .orderBy(desc(movements.occurredOn), desc(movements.sequence))
    .limit(limit + 1);
  const { heads, nextCursor } = pageOfHeads(rows, limit);
  const lines = byRecord(await linesOf(db, { outfitId, movementIds: heads.map((head) => head.id) }), (row) => row.movementId);
  return {
    items: heads.map((head) => ({ ...recordOf(head), lines: (lines.get(head.id) ?? []).map(({ movementId: _movementId, ...line }) => line) })),
    nextCursor,
  };
}

/** What the lines that fit a filter weigh together, into the place when positive; null when the filter says nothing of lines. */
export async function totalOfLines(db: Reader, query: { outfitId: string } & MovementListQuery): Promise<DecimalString | null> {
  const fits = lineFilter(query);
  if (!fits || query.documentType !== undefined) return null;
  const [row] = await db
    .select({ total: sql<DecimalString>`coalesce(sum(${movementLines.quantity}), 0)` })
    .from(movementLines)
    .where(fits);
  return trim(row?.total ?? "0");
}
