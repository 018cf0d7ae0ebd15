import "server-only";
import { database } from "@/db/client";
import { lineAmount } from "@/lib/arithmetic/price";
import type { Context } from "@/lib/auth/context";
import { seesTicketMoney } from "@/lib/auth/permissions";
import { AppError } from "@/lib/http/errors";
import { pricesInForce, type PriceInForce } from "@/lib/prices/queries";
import { checkArithmetic } from "./rules";
import type { Ticket, TicketCheck } from "./schema";
import { seeTicket } from "./service";

type SeenLine = Ticket["lines"][number] & { price: string; amountMinor: number };

/** What a line pays more or less than the yard's sheet would for the same net; null where there is nothing to compare. */
function againstSheet(ctx: Context, line: SeenLine, sheet: PriceInForce | undefined): number | null {
  if (!sheet || (sheet.per === "each" && line.pieces === null)) return null;
  const { weightUnit, exponent } = ctx.outfit;
  const atSheet = lineAmount({
    quantity: line.net,
    unit: weightUnit,
    price: sheet.price,
    per: sheet.per,
    exponent,
    ...(line.pieces === null ? {} : { pieces: line.pieces }),
  });
  return line.amountMinor - atSheet;
}

/** Holds a kept ticket against its own sums and against the yard's sheet in force on its date. */
export async function checkTicket(ctx: Context, id: string): Promise<TicketCheck> {
  if (!seesTicketMoney(ctx.actor.role, ctx.outfit.hidesMoney))
    throw new AppError("forbidden", "The check shows money, which your role does not see. Ask the owner.");
  const ticket = await seeTicket(ctx, id);
  const lines = ticket.lines as SeenLine[];
  const sheets = (await pricesInForce(database(), { outfitId: ctx.outfit.id, on: ticket.ticketOn })).filter((price) => price.yardId === ticket.yardId);
  const compared = lines.map((line) => {
    const sheet = sheets.find((price) => price.gradeId === (line.soldAsGradeId ?? line.gradeId));
    return {
      line: line.line,
      gradeName: line.gradeName,
      price: line.price,
      per: line.per,
      sheetPrice: sheet?.price ?? null,
      sheetPer: sheet?.per ?? null,
      sheetFrom: sheet?.inForceFrom ?? null,
      differenceMinor: againstSheet(ctx, line, sheet),
    };
  });
  return {
    sums: checkArithmetic({ lines, taxMinor: ticket.taxMinor ?? 0, feeMinor: ticket.feeMinor ?? 0, totalMinor: ticket.totalMinor ?? 0 }, ctx.outfit),
    lines: compared,
    underSheetMinor: compared.reduce((total, { differenceMinor }) => total + Math.min(differenceMinor ?? 0, 0), 0),
  };
}
