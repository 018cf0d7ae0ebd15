import "server-only";
import { and, asc, eq, isNull, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { bins, grades, yards } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { seesPrices } from "@/lib/auth/permissions";
import { pricesInForce } from "@/lib/prices/queries";
import { getTicket } from "./queries";
import type { Ticket } from "./schema";

/** What the ticket form offers: yards in use, grades, bins with what they hold, and the prices in force. Four queries at once. */
export async function ticketChoices(ctx: Context) {
  const db = database();
  const outfitId = ctx.outfit.id;
  const [yardRows, gradeRows, binRows, priceRows] = await Promise.all([
    db
      .select({ id: yards.id, name: yards.name })
      .from(yards)
      .where(and(eq(yards.outfitId, outfitId), eq(yards.active, true)))
      .orderBy(asc(yards.name)),
    db
      .select({ id: grades.id, name: grades.name, family: grades.family })
      .from(grades)
      .where(and(eq(grades.outfitId, outfitId), eq(grades.active, true)))
      .orderBy(asc(grades.position)),
    db
      .select({
        id: bins.id,
        label: bins.label,
        gradeId: bins.gradeId,
        balance: sql<string>`coalesce((select b.quantity from bin_balances b where b.outfit_id = ${bins.outfitId} and b.bin_id = ${bins.id}), 0)`,
      })
      .from(bins)
      .where(and(eq(bins.outfitId, outfitId), isNull(bins.putAwayAt)))
      .orderBy(asc(bins.label)),
    seesPrices(ctx.actor.role, ctx.outfit.hidesMoney) ? pricesInForce(db, { outfitId, on: ctx.today }) : [],
  ]);
  return {
    yards: yardRows,
    grades: gradeRows,
    bins: binRows.map((bin) => ({ ...bin, balance: trim(bin.balance) })),
    prices: priceRows.map(({ yardId, gradeId, price, per, yardWording, inForceFrom }) => ({ yardId, gradeId, price, per, wording: yardWording, inForceFrom })),
  };
}

/** One sale ticket with the money that this member sees, or null. */
export const findTicket = (ctx: Context, id: string): Promise<Ticket | null> => getTicket(database(), { outfitId: ctx.outfit.id, id, viewer: ctx });
