import "server-only";
import { and, asc, eq, gte, inArray, isNotNull, isNull, sql } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { accountMonths, accounts, binBalances, bins, grades, itemKinds, outfits, pickupItems, pickups, tickets, yards } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { seesCost, seesPrices, seesTicketMoney } from "@/lib/auth/permissions";
import { daysBetween, monthBounds, monthOf } from "@/lib/clock";
import { minorOf } from "@/lib/money/queries";
import { bestOf, pricesInForce, type BestPrice, type PriceInForce } from "@/lib/prices/queries";
import { atSellPoint, standingOf, type FullBin, type Holding, type Standing } from "./rules";

/** What the bins hold, by grade. */
export async function holdingsOf(db: Reader, { outfitId }: { outfitId: string }): Promise<Holding[]> {
  const rows = await db
    .select({ gradeId: bins.gradeId, family: grades.family, quantity: sql<string>`sum(${binBalances.quantity})` })
    .from(binBalances)
    .innerJoin(bins, and(eq(bins.outfitId, binBalances.outfitId), eq(bins.id, binBalances.binId)))
    .innerJoin(grades, and(eq(grades.outfitId, bins.outfitId), eq(grades.id, bins.gradeId)))
    .where(eq(binBalances.outfitId, outfitId))
    .groupBy(bins.gradeId, grades.family, grades.position)
    .orderBy(asc(grades.position));
  return rows.map((row) => ({ ...row, quantity: trim(row.quantity) }));
}

/** What stands in the shop, with the prices it is valued by; both empty of money for those who do not see prices. */
export type Shop = { standing: Standing; prices: PriceInForce[]; best: Map<string, BestPrice> };

/** Two reads at once: what the bins hold, and the prices in force. */
export async function shopOf(db: Reader, ctx: Context): Promise<Shop> {
  const outfitId = ctx.outfit.id;
  const [holdings, prices] = await Promise.all([
    holdingsOf(db, { outfitId }),
    seesPrices(ctx.actor.role, ctx.outfit.hidesMoney) ? pricesInForce(db, { outfitId, on: ctx.today }) : [],
  ]);
  const best = bestOf(prices);
  return { standing: standingOf(holdings, best, ctx.outfit), prices, best };
}

/** The live figures of the line, as this member may see them: what they may not see is null. */
export type LineFigures = {
  openPickups: number;
  binsWeight: string;
  binsValueMinor: number | null;
  unpaidTickets: number;
  unpaidMinor: number | null;
  /** The month's net so far. */
  netMinor: number | null;
  /** What this member spent on costs this month. */
  ownCostsMinor: number;
  members: number;
  /** Age in days of the oldest sheet that a best price leans on; null without prices. */
  oldestPriceDays: number | null;
};

async function countsOf(db: Reader, ctx: Context) {
  const { id: outfitId } = ctx.outfit;
  const month = monthOf(ctx.today);
  const { first, last } = monthBounds(month);
  const [row] = await db
    .select({
      openPickups: sql<string>`(select count(*) from pickups p where p.outfit_id = ${outfitId} and p.state = 'open')`.mapWith(minorOf),
      unpaidTickets: sql<string>`(select count(*) from tickets t where t.outfit_id = ${outfitId} and t.state = 'posted')`.mapWith(minorOf),
      unpaidMinor:
        sql<string>`(select coalesce(sum(t.total_minor - t.paid_minor), 0) from tickets t where t.outfit_id = ${outfitId} and t.state = 'posted')`.mapWith(
          minorOf,
        ),
      netMinor: sql<string>`(select coalesce(-sum(m.amount_minor), 0) from account_months m join accounts a on a.outfit_id = m.outfit_id and a.code = m.account
        where m.outfit_id = ${outfitId} and m.month = ${month} and a.kind in ('income', 'expense'))`.mapWith(minorOf),
      ownCostsMinor: sql<string>`(select coalesce(sum(c.amount_minor), 0) from costs c where c.outfit_id = ${outfitId} and c.made_by = ${ctx.actor.memberId}
        and c.spent_on between ${first} and ${last} and c.voided_at is null)`.mapWith(minorOf),
      members: sql<string>`(select count(*) from memberships m where m.outfit_id = ${outfitId} and m.removed_at is null)`.mapWith(minorOf),
    })
    .from(outfits)
    .where(eq(outfits.id, outfitId));
  return row ?? { openPickups: 0, unpaidTickets: 0, unpaidMinor: 0, netMinor: 0, ownCostsMinor: 0, members: 0 };
}

/** The figures of the line. One read beside those of the shop, which may be handed in when they were read already. */
export async function lineFigures(db: Reader, ctx: Context, shop: Promise<Shop> = shopOf(db, ctx)): Promise<LineFigures> {
  const [counts, { standing, best }] = await Promise.all([countsOf(db, ctx), shop]);
  const { role } = ctx.actor;
  const oldest = [...best.values()].map((price) => price.inForceFrom).sort()[0];
  return {
    ...counts,
    binsWeight: standing.quantity,
    binsValueMinor: seesPrices(role, ctx.outfit.hidesMoney) ? standing.valueMinor : null,
    unpaidMinor: seesTicketMoney(role, ctx.outfit.hidesMoney) ? counts.unpaidMinor : null,
    netMinor: seesCost(role) ? counts.netMinor : null,
    oldestPriceDays: oldest === undefined ? null : daysBetween(oldest, ctx.today),
  };
}

/** Item kinds in open hauls that wait for a record before anything is cut or sold, the oldest haul first. */
export const heldItems = (db: Reader, { outfitId }: { outfitId: string }) =>
  db
    .select({
      pickupId: pickups.id,
      number: pickups.number,
      pickedUpOn: pickups.pickedUpOn,
      kindName: itemKinds.name,
      record: sql<string>`${itemKinds.holdUntil}`,
    })
    .from(pickups)
    .innerJoin(pickupItems, and(eq(pickupItems.outfitId, pickups.outfitId), eq(pickupItems.pickupId, pickups.id)))
    .innerJoin(itemKinds, and(eq(itemKinds.outfitId, pickupItems.outfitId), eq(itemKinds.id, pickupItems.itemKindId)))
    .where(and(eq(pickups.outfitId, outfitId), eq(pickups.state, "open"), isNotNull(itemKinds.holdUntil)))
    .groupBy(pickups.id, pickups.number, pickups.pickedUpOn, itemKinds.name, itemKinds.holdUntil)
    .orderBy(asc(pickups.pickedUpOn), asc(pickups.number));

/** Drafts and unpaid tickets, the oldest first. */
export const waitingTickets = (db: Reader, { outfitId }: { outfitId: string }) =>
  db
    .select({
      ticketId: tickets.id,
      number: tickets.number,
      yardName: yards.name,
      ticketOn: tickets.ticketOn,
      state: tickets.state,
      paperSaysSo: tickets.paperSaysSo,
      totalMinor: tickets.totalMinor,
      paidMinor: tickets.paidMinor,
    })
    .from(tickets)
    .innerJoin(yards, and(eq(yards.outfitId, tickets.outfitId), eq(yards.id, tickets.yardId)))
    .where(and(eq(tickets.outfitId, outfitId), inArray(tickets.state, ["draft", "posted"])))
    .orderBy(asc(tickets.ticketOn), asc(tickets.id));

/** Bins in use that hold their sell point or more. */
export async function fullBins(db: Reader, { outfitId }: { outfitId: string }): Promise<FullBin[]> {
  const rows = await db
    .select({ binId: bins.id, label: bins.label, gradeId: bins.gradeId, gradeName: grades.name, quantity: binBalances.quantity, sellPoint: bins.sellPoint })
    .from(bins)
    .innerJoin(binBalances, and(eq(binBalances.outfitId, bins.outfitId), eq(binBalances.binId, bins.id)))
    .innerJoin(grades, and(eq(grades.outfitId, bins.outfitId), eq(grades.id, bins.gradeId)))
    .where(and(eq(bins.outfitId, outfitId), isNull(bins.putAwayAt), isNotNull(bins.sellPoint), gte(binBalances.quantity, sql`${bins.sellPoint}`)))
    .orderBy(asc(grades.position), asc(bins.label));
  return rows.flatMap(({ sellPoint, ...row }) => (sellPoint === null ? [] : [{ ...row, sellPoint }])).filter(atSellPoint);
}

/** Sales, cost of scrap, running and other costs of a month, as far as it has come; costs positive. */
export async function monthSoFar(db: Reader, { outfitId, month }: { outfitId: string; month: string }) {
  const of = (which: ReturnType<typeof sql>) => sql<number>`coalesce(sum(if(${which}, ${accountMonths.amountMinor}, 0)), 0)`.mapWith(minorOf);
  const [row] = await db
    .select({
      incomeMinor: sql<number>`coalesce(-sum(if(${accounts.kind} = 'income', ${accountMonths.amountMinor}, 0)), 0)`.mapWith(minorOf),
      scrapMinor: of(sql`${accounts.code} = 'cost-of-scrap-sold'`),
      costsMinor: of(sql`${accounts.kind} = 'expense' and ${accounts.code} <> 'cost-of-scrap-sold'`),
    })
    .from(accountMonths)
    .innerJoin(accounts, and(eq(accounts.outfitId, accountMonths.outfitId), eq(accounts.code, accountMonths.account)))
    .where(and(eq(accountMonths.outfitId, outfitId), eq(accountMonths.month, month)));
  return row ?? { incomeMinor: 0, scrapMinor: 0, costsMinor: 0 };
}
