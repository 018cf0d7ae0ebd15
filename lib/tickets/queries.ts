import "server-only";
import { and, asc, desc, eq, gte, inArray, lt, lte, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Reader } from "@/db/client";
import { bins, grades, memberships, ticketLines, ticketPayments, tickets, users, yards } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import type { Actor, Outfit } from "@/lib/auth/context";
import { seesTicketMoney } from "@/lib/auth/permissions";
import { isRealDate } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import type { Ticket, TicketHead, TicketListQuery } from "./schema";

/** Whose eyes a ticket is read for: a sorter sees it without money. */
export type Viewer = { outfit: Outfit; actor: Actor };

const selectHeads = (db: Reader) =>
  db
    .select({
      id: tickets.id,
      yardId: tickets.yardId,
      yardName: yards.name,
      number: tickets.number,
      ticketOn: tickets.ticketOn,
      state: tickets.state,
      taxMinor: tickets.taxMinor,
      feeMinor: tickets.feeMinor,
      differenceMinor: tickets.differenceMinor,
      totalMinor: tickets.totalMinor,
      paidMinor: tickets.paidMinor,
      paymentMethod: tickets.paymentMethod,
      paperSaysSo: tickets.paperSaysSo,
      note: tickets.note,
      version: tickets.version,
      makerId: tickets.madeBy,
      makerName: users.name,
      madeAt: tickets.madeAt,
      postedAt: tickets.postedAt,
      voidedAt: tickets.voidedAt,
      quantity: sql<string>`(select coalesce(sum(l.net), 0) from ticket_lines l where l.outfit_id = ${tickets.outfitId} and l.ticket_id = ${tickets.id})`,
      lineCount: sql<number>`(select count(*) from ticket_lines l where l.outfit_id = ${tickets.outfitId} and l.ticket_id = ${tickets.id})`.mapWith(Number),
    })
    .from(tickets)
    .innerJoin(yards, and(eq(yards.outfitId, tickets.outfitId), eq(yards.id, tickets.yardId)))
    .innerJoin(memberships, and(eq(memberships.outfitId, tickets.outfitId), eq(memberships.id, tickets.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId));

type Row = Awaited<ReturnType<ReturnType<typeof selectHeads>["execute"]>>[number];

function headOf(row: Row, money: boolean): TicketHead {
  const standing = row.state === "posted" || row.state === "paid";
  return {
    id: row.id,
    yardId: row.yardId,
    yardName: row.yardName,
    number: row.number,
    ticketOn: row.ticketOn,
    state: row.state,
    quantity: trim(row.quantity),
    lineCount: row.lineCount,
    totalMinor: money ? row.totalMinor : null,
    paidMinor: money ? row.paidMinor : null,
    leftMinor: money ? (standing ? row.totalMinor - row.paidMinor : 0) : null,
    paymentMethod: row.paymentMethod,
    paperSaysSo: row.paperSaysSo,
    madeBy: { id: row.makerId, name: row.makerName },
    madeAt: row.madeAt.toISOString(),
    version: row.version,
  };
}

const seesMoney = (viewer: Viewer) => seesTicketMoney(viewer.actor.role, viewer.outfit.hidesMoney);

/** A page of sale tickets, newest first. */
export async function listTickets(db: Reader, { outfitId, viewer, ...query }: { outfitId: string; viewer: Viewer } & TicketListQuery) {
  const after = decodeCursor(query.cursor);
  if (after && (!isRealDate(after.at) || !isId(after.id))) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  const state = query.state === "unpaid" ? "posted" : query.state;
  const rows = await selectHeads(db)
    .where(
      and(
        eq(tickets.outfitId, outfitId),
        state ? eq(tickets.state, state) : undefined,
        query.yardId ? eq(tickets.yardId, query.yardId) : undefined,
        query.from ? gte(tickets.ticketOn, query.from) : undefined,
        query.to ? lte(tickets.ticketOn, query.to) : undefined,
        after ? and(lte(tickets.ticketOn, after.at), or(lt(tickets.ticketOn, after.at), lt(tickets.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(tickets.ticketOn), desc(tickets.id))
    .limit(query.limit + 1);
  const page = toPage(rows, query.limit, (row) => ({ at: row.ticketOn, id: row.id }));
  return { items: page.items.map((row) => headOf(row, seesMoney(viewer))), nextCursor: page.nextCursor };
}

async function linesOf(db: Reader, { outfitId, ticketId, money }: { outfitId: string; ticketId: string; money: boolean }): Promise<Ticket["lines"]> {
  const soldAs = alias(grades, "sold_as");
  const rows = await db
    .select({
      line: ticketLines.line,
      gradeId: ticketLines.gradeId,
      gradeName: grades.name,
      family: grades.family,
      soldAsGradeId: ticketLines.soldAsGradeId,
      soldAsGradeName: soldAs.name,
      binId: ticketLines.binId,
      binLabel: bins.label,
      gross: ticketLines.gross,
      tare: ticketLines.tare,
      deduction: ticketLines.deduction,
      net: ticketLines.net,
      pieces: ticketLines.pieces,
      price: ticketLines.price,
      per: ticketLines.per,
      amountMinor: ticketLines.amountMinor,
      yardWording: ticketLines.yardWording,
    })
    .from(ticketLines)
    .innerJoin(grades, and(eq(grades.outfitId, ticketLines.outfitId), eq(grades.id, ticketLines.gradeId)))
    .leftJoin(soldAs, and(eq(soldAs.outfitId, ticketLines.outfitId), eq(soldAs.id, ticketLines.soldAsGradeId)))
    .leftJoin(bins, and(eq(bins.outfitId, ticketLines.outfitId), eq(bins.id, ticketLines.binId)))
    .where(and(eq(ticketLines.outfitId, outfitId), eq(ticketLines.ticketId, ticketId)))
    .orderBy(asc(ticketLines.line));
  const trimmed = (text: string | null) => (text === null ? null : trim(text));
  return rows.map((row) => ({
    ...row,
    gross: trimmed(row.gross),
    tare: trimmed(row.tare),
    deduction: trimmed(row.deduction),
    net: trim(row.net),
    price: money ? trim(row.price) : null,
    amountMinor: money ? row.amountMinor : null,
  }));
}

async function paymentsOf(db: Reader, { outfitId, ticketId, money }: { outfitId: string; ticketId: string; money: boolean }): Promise<Ticket["payments"]> {
  const rows = await db
    .select({
      id: ticketPayments.id,
      paidOn: ticketPayments.paidOn,
      amountMinor: ticketPayments.amountMinor,
      method: ticketPayments.method,
      voidedAt: ticketPayments.voidedAt,
      makerId: ticketPayments.madeBy,
      makerName: users.name,
    })
    .from(ticketPayments)
    .innerJoin(memberships, and(eq(memberships.outfitId, ticketPayments.outfitId), eq(memberships.id, ticketPayments.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(ticketPayments.outfitId, outfitId), eq(ticketPayments.ticketId, ticketId)))
    .orderBy(asc(ticketPayments.paidOn), asc(ticketPayments.id));
  return rows.map(({ makerId, makerName, voidedAt, ...row }) => ({
    ...row,
    amountMinor: money ? row.amountMinor : null,
    madeBy: { id: makerId, name: makerName },
    voidedAt: voidedAt?.toISOString() ?? null,
  }));
}

/** One sale ticket with its lines and payments, or null. */
export async function getTicket(db: Reader, { outfitId, id, viewer }: { outfitId: string; id: string; viewer: Viewer }): Promise<Ticket | null> {
  if (!isId(id)) return null;
  const [row] = await selectHeads(db).where(and(eq(tickets.outfitId, outfitId), eq(tickets.id, id)));
  if (!row) return null;
  const money = seesMoney(viewer);
  return {
    ...headOf(row, money),
    taxMinor: money ? row.taxMinor : null,
    feeMinor: money ? row.feeMinor : null,
    differenceMinor: money ? row.differenceMinor : null,
    note: row.note,
    postedAt: row.postedAt?.toISOString() ?? null,
    voidedAt: row.voidedAt?.toISOString() ?? null,
    lines: await linesOf(db, { outfitId, ticketId: id, money }),
    payments: await paymentsOf(db, { outfitId, ticketId: id, money }),
  };
}

/** The bins in use of some grades with what they hold. */
export const binsHolding = (db: Reader, { outfitId, gradeIds }: { outfitId: string; gradeIds: string[] }) =>
  db
    .select({
      binId: bins.id,
      gradeId: bins.gradeId,
      quantity: sql<string>`coalesce((select b.quantity from bin_balances b where b.outfit_id = ${bins.outfitId} and b.bin_id = ${bins.id}), 0)`,
    })
    .from(bins)
    .where(and(eq(bins.outfitId, outfitId), inArray(bins.gradeId, gradeIds)))
    .orderBy(asc(bins.label));
