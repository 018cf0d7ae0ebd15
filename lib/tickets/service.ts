import "server-only";
import { and, eq, inArray, isNull } from "drizzle-orm";
import { database } from "@/db/client";
import { bins, grades, ticketLines, ticketPayments, tickets, yards } from "@/db/schema";
import { isDuplicateKey, type Transaction } from "@/db/transaction";
import { isPositive, trim } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { openBooks, type Books } from "@/lib/books/books";
import { reverseDocument } from "@/lib/books/reverse";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound, type FieldError } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { rememberWordings } from "@/lib/prices/service";
import { binsHolding, getTicket, listTickets } from "./queries";
import { checkArithmetic, costOfSale, drawFrom, missingPieces, paymentPostings, saleBooking, totalOf, withinBooks, type Draw } from "./rules";
import type { PaymentInput, Ticket, TicketInput, TicketListQuery } from "./schema";

/** A page of sale tickets, with the money that this member sees. */
export const seeTickets = (ctx: Context, query: TicketListQuery) => listTickets(database(), { outfitId: ctx.outfit.id, viewer: ctx, ...query });

/** One sale ticket. Throws `not-found`. */
export const seeTicket = (ctx: Context, id: string): Promise<Ticket> => requireTicket(database(), ctx, id);

async function requireTicket(db: Parameters<typeof getTicket>[0], ctx: Context, id: string): Promise<Ticket> {
  const ticket = await getTicket(db, { outfitId: ctx.outfit.id, id, viewer: ctx });
  if (!ticket) throw notFound("sale ticket");
  return ticket;
}

/** Refuses sums that do not add up unless the person says that the paper has them so. */
function requireSums(ctx: Context, input: TicketInput): void {
  if (input.ticketOn > ctx.today) throw fieldError("ticketOn", "Date must be today or earlier.");
  const missing = missingPieces(input.lines).map((index): FieldError => ({
    path: `lines.${index}.pieces`,
    message: "Enter the number of pieces: the price is per piece.",
  }));
  if (missing.length > 0) throw new AppError("input", "Enter the number of pieces.", { errors: missing });
  if (!withinBooks(input, ctx.outfit)) throw fieldError("totalMinor", "The amounts are larger than the books can hold. Look at the net and the price again.");
  const wrong = checkArithmetic(input, ctx.outfit);
  const impossible = wrong.filter((sum) => sum.path.endsWith(".tare"));
  const refused = impossible.length > 0 ? impossible : input.paperSaysSo ? [] : wrong;
  if (refused.length === 0) return;
  const detail = impossible.length > 0 ? "Tare is more than gross." : "Some sums do not add up. Correct them, or say that the paper has them so.";
  throw new AppError("input", detail, { errors: refused.map(({ path, message }) => ({ path, message })) });
}

/** Throws `input` that names each thing of the paper that is not this outfit's. */
async function requireKnown(tx: Transaction, ctx: Context, input: TicketInput): Promise<void> {
  const { id: outfitId } = ctx.outfit;
  const gradeIds = [...new Set(input.lines.flatMap((line) => [line.gradeId, ...(line.soldAsGradeId ? [line.soldAsGradeId] : [])]))];
  const binIds = [...new Set(input.lines.flatMap((line) => (line.binId ? [line.binId] : [])))];
  const [yard] = await tx
    .select({ id: yards.id })
    .from(yards)
    .where(and(eq(yards.outfitId, outfitId), eq(yards.id, input.yardId)));
  const knownGrades = await tx
    .select({ id: grades.id })
    .from(grades)
    .where(and(eq(grades.outfitId, outfitId), inArray(grades.id, gradeIds)));
  const knownBins =
    binIds.length === 0
      ? []
      : await tx
          .select({ id: bins.id, gradeId: bins.gradeId, label: bins.label })
          .from(bins)
          .where(and(eq(bins.outfitId, outfitId), inArray(bins.id, binIds)));
  const gradeSet = new Set(knownGrades.map((grade) => grade.id));
  const binMap = new Map(knownBins.map((bin) => [bin.id, bin]));
  const errors: FieldError[] = yard ? [] : [{ path: "yardId", message: "There is no such yard here." }];
  input.lines.forEach((line, index) => {
    if (!gradeSet.has(line.gradeId)) errors.push({ path: `lines.${index}.gradeId`, message: "There is no such grade here." });
    if (line.soldAsGradeId && !gradeSet.has(line.soldAsGradeId)) errors.push({ path: `lines.${index}.soldAsGradeId`, message: "There is no such grade here." });
    if (!line.binId) return;
    const bin = binMap.get(line.binId);
    if (!bin) errors.push({ path: `lines.${index}.binId`, message: "There is no such bin here." });
    else if (bin.gradeId !== line.gradeId)
      errors.push({ path: `lines.${index}.binId`, message: `${bin.label} holds another grade. Choose one of this grade's bins.` });
  });
  if (errors.length > 0) throw new AppError("input", errors[0]?.message ?? "", { errors });
}

function numberTaken(error: unknown, number: string): unknown {
  if (!isDuplicateKey(error)) return error;
  const message = `Ticket ${number} of this yard is entered already. Open that one, or void it first.`;
  return new AppError("conflict", message, { errors: [{ path: "number", message }], cause: error });
}

const headValues = (input: TicketInput) => ({
  yardId: input.yardId,
  number: input.number,
  ticketOn: input.ticketOn,
  taxMinor: input.taxMinor,
  feeMinor: input.feeMinor,
  differenceMinor: input.totalMinor - totalOf(input),
  totalMinor: input.totalMinor,
  paymentMethod: input.paymentMethod ?? null,
  paperSaysSo: input.paperSaysSo,
  note: input.note ?? null,
});

async function writeLines(tx: Transaction, ctx: Context, ticketId: string, input: TicketInput): Promise<void> {
  await tx.insert(ticketLines).values(
    input.lines.map((line, index) => ({
      outfitId: ctx.outfit.id,
      ticketId,
      line: index + 1,
      gradeId: line.gradeId,
      soldAsGradeId: line.soldAsGradeId ?? null,
      binId: line.binId ?? null,
      gross: line.gross ?? null,
      tare: line.tare ?? null,
      deduction: line.deduction ?? null,
      net: line.net,
      pieces: line.pieces ?? null,
      price: line.price,
      per: line.per,
      amountMinor: line.amountMinor,
      yardWording: line.yardWording ?? null,
    })),
  );
  await rememberWordings(tx, ctx, input.yardId, input.lines);
}

/** Keeps the yard's paper as a draft: nothing is booked yet. Throws `input` for sums that do not add up, `conflict` when the paper is entered already. */
export async function draftTicket(ctx: Context, input: TicketInput): Promise<Ticket> {
  requireSums(ctx, input);
  return transact(ctx, async (tx) => {
    await requireKnown(tx, ctx, input);
    const id = input.id ?? newId();
    try {
      await tx.insert(tickets).values({ ...headValues(input), outfitId: ctx.outfit.id, id, madeBy: ctx.actor.memberId, madeAt: ctx.now });
    } catch (error) {
      throw numberTaken(error, input.number);
    }
    await writeLines(tx, ctx, id, input);
    await audit(tx, ctx, "draft-ticket", { type: "ticket", id });
    return requireTicket(tx, ctx, id);
  });
}

/** Types a draft again. Throws `stale` when somebody changed it first, `conflict` when it is no draft any more. */
export async function changeDraft(ctx: Context, id: string, input: TicketInput): Promise<Ticket> {
  requireSums(ctx, input);
  return transact(ctx, async (tx) => {
    const before = await requireTicket(tx, ctx, id);
    if (before.state !== "draft") throw new AppError("conflict", `Ticket ${before.number} is ${before.state}. Void it and enter it again to change it.`);
    if (before.version !== ctx.ifMatch) throw new AppError("stale", "The draft was changed since you opened it. Look at it again.", { current: before });
    await requireKnown(tx, ctx, input);
    const where = and(eq(tickets.outfitId, ctx.outfit.id), eq(tickets.id, id), eq(tickets.version, before.version), eq(tickets.state, "draft"));
    try {
      const [result] = await tx
        .update(tickets)
        .set({ ...headValues(input), version: before.version + 1 })
        .where(where);
      if (result.affectedRows === 0)
        throw new AppError("stale", "The draft was changed since you opened it. Look at it again.", { current: await requireTicket(tx, ctx, id) });
    } catch (error) {
      throw numberTaken(error, input.number);
    }
    await tx.delete(ticketLines).where(and(eq(ticketLines.outfitId, ctx.outfit.id), eq(ticketLines.ticketId, id)));
    await writeLines(tx, ctx, id, input);
    await audit(tx, ctx, "change-ticket", { type: "ticket", id }, { before });
    return requireTicket(tx, ctx, id);
  });
}

type Row = typeof tickets.$inferSelect;

/** The ticket's row, read under the outfit's lock so that its state stays as it is until the end of the transaction. */
async function requireRow(books: Books, id: string): Promise<Row> {
  if (!isId(id)) throw notFound("sale ticket");
  const [row] = await books.tx
    .select()
    .from(tickets)
    .where(and(eq(tickets.outfitId, books.ctx.outfit.id), eq(tickets.id, id)));
  if (!row) throw notFound("sale ticket");
  return row;
}

type Line = { line: number; gradeId: string; binId: string | null; net: string; amountMinor: number };

/** The bins that each line leaves. Throws `books-refuse` that says by how much they fall short. */
async function drawsOf(books: Books, lines: Line[]): Promise<Draw[]> {
  const { ctx } = books;
  const held = await binsHolding(books.tx, { outfitId: ctx.outfit.id, gradeIds: [...new Set(lines.map((line) => line.gradeId))] });
  const left = held.map((bin) => ({ ...bin, quantity: trim(bin.quantity) }));
  const draws: Draw[] = [];
  const errors: FieldError[] = [];
  for (const line of lines) {
    const { draws: drawn, missing } = drawFrom(
      line,
      left.filter((bin) => bin.gradeId === line.gradeId),
    );
    draws.push(...drawn);
    if (isPositive(missing)) {
      const what = line.binId === null ? "The bins of this grade hold" : "The bin holds";
      errors.push({
        path: `lines.${line.line - 1}.net`,
        message: `${what} ${missing} ${ctx.outfit.weightUnit} less than this line sells. Count them first, then post again.`,
      });
    }
  }
  if (errors.length > 0) throw new AppError("books-refuse", errors[0]?.message ?? "", { errors });
  return draws;
}

/** Posts a draft into both books. Throws `conflict` when it is no draft, `books-refuse` when the bins hold less than it sells. */
export async function postTicket(ctx: Context, id: string): Promise<Ticket> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const ticket = await requireRow(books, id);
    if (ticket.state !== "draft") throw new AppError("conflict", `Ticket ${ticket.number} is ${ticket.state} already.`);
    const lines = await tx
      .select({ line: ticketLines.line, gradeId: ticketLines.gradeId, binId: ticketLines.binId, net: ticketLines.net, amountMinor: ticketLines.amountMinor })
      .from(ticketLines)
      .where(and(eq(ticketLines.outfitId, ctx.outfit.id), eq(ticketLines.ticketId, id)))
      .orderBy(ticketLines.line);
    const draws = await drawsOf(books, lines);
    const costs = costOfSale(lines, await books.stock([...new Set(lines.map((line) => line.gradeId))]));
    const { yardId, taxMinor, feeMinor, differenceMinor, totalMinor } = ticket;
    const sides = saleBooking({ ticketId: id, yardId, draws, lines, costs, taxMinor, feeMinor, differenceMinor, totalMinor });
    await books.post({ kind: "ticket", on: ticket.ticketOn, document: { type: "ticket", id }, ...sides });
    await setState(books, ticket, { state: totalMinor === 0 ? "paid" : "posted", postedBy: ctx.actor.memberId, postedAt: ctx.now });
    await audit(tx, ctx, "post-ticket", { type: "ticket", id });
    return requireTicket(tx, ctx, id);
  });
}

async function setState(books: Books, ticket: Row, change: Partial<typeof tickets.$inferInsert>): Promise<void> {
  await books.tx
    .update(tickets)
    .set({ ...change, version: ticket.version + 1 })
    .where(and(eq(tickets.outfitId, books.ctx.outfit.id), eq(tickets.id, ticket.id)));
}

/** Records money that the yard paid. Throws `books-refuse` for more than is still owed, `conflict` for a ticket that is not posted. */
export async function payTicket(ctx: Context, ticketId: string, input: PaymentInput): Promise<Ticket> {
  if (input.paidOn > ctx.today) throw fieldError("paidOn", "Date must be today or earlier.");
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const ticket = await requireRow(books, ticketId);
    if (ticket.state !== "posted") {
      throw new AppError(
        "conflict",
        ticket.state === "paid" ? `Ticket ${ticket.number} is paid in full.` : `Ticket ${ticket.number} is ${ticket.state}. Only a posted ticket is paid.`,
      );
    }
    const paidMinor = ticket.paidMinor + input.amountMinor;
    if (paidMinor > ticket.totalMinor) {
      const message = "This is more than the yard still owes on the ticket. Look at the amount again.";
      throw new AppError("books-refuse", message, { errors: [{ path: "amountMinor", message }] });
    }
    const id = input.id ?? newId();
    const { paidOn, amountMinor, method } = input;
    await tx.insert(ticketPayments).values({ outfitId: ctx.outfit.id, id, ticketId, paidOn, amountMinor, method, madeBy: ctx.actor.memberId, madeAt: ctx.now });
    const postings = paymentPostings({ amountMinor, method, yardId: ticket.yardId, ticketId });
    await books.post({ kind: "payment", on: paidOn, document: { type: "payment", id }, lines: [], postings });
    await setState(books, ticket, { paidMinor, state: paidMinor === ticket.totalMinor ? "paid" : "posted" });
    await audit(tx, ctx, "pay-ticket", { type: "ticket", id: ticketId });
    return requireTicket(tx, ctx, ticketId);
  });
}

/** Takes a ticket back: its payments first, then the sale, in both books. A draft only changes its state. Throws `conflict` when it is void already. */
export async function voidTicket(ctx: Context, id: string): Promise<Ticket> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const ticket = await requireRow(books, id);
    if (ticket.state === "void") throw new AppError("conflict", `Ticket ${ticket.number} is void already.`);
    if (ticket.state !== "draft") {
      const standing = and(eq(ticketPayments.outfitId, ctx.outfit.id), eq(ticketPayments.ticketId, id), isNull(ticketPayments.voidedAt));
      const payments = await tx.select({ id: ticketPayments.id }).from(ticketPayments).where(standing);
      for (const payment of payments) await reverseDocument(books, { type: "payment", id: payment.id });
      await tx.update(ticketPayments).set({ voidedAt: ctx.now }).where(standing);
      await reverseDocument(books, { type: "ticket", id });
    }
    await setState(books, ticket, { state: "void", paidMinor: 0, voidedBy: ctx.actor.memberId, voidedAt: ctx.now });
    await audit(tx, ctx, "void-ticket", { type: "ticket", id });
    return requireTicket(tx, ctx, id);
  });
}
