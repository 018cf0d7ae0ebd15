import "server-only";
import { cache } from "react";
import { database } from "@/db/client";
import type { Context } from "@/lib/auth/context";
import { can, seesCost, seesPrices, seesTicketMoney } from "@/lib/auth/permissions";
import { addDays, daysBetween, monthOf } from "@/lib/clock";
import { recordName } from "@/lib/catalogue/hazards";
import { outfitsOf } from "@/lib/people/queries";
import type { BestPrice } from "@/lib/prices/queries";
import { fullBins, heldItems, lineFigures, monthSoFar, shopOf, waitingTickets, type LineFigures, type Shop } from "./queries";
import { staleSheets, type FullBin, type StaleSheet } from "./rules";

/** Both the line and Today show what stands in the shop, so it is read once a request. */
const shopToday = cache((ctx: Context): Promise<Shop> => shopOf(database(), ctx));

/** The figures of the line for a page. */
export const lineOf = (ctx: Context): Promise<LineFigures> => lineFigures(database(), ctx, shopToday(ctx));

/** Every outfit of the person who is signed in, for the switch in the top bar. */
export const outfitsOfPerson = (ctx: Context) => outfitsOf(database(), { userId: ctx.actor.userId });

/** One thing that waits for somebody. Amounts are null for those who may not see them. */
export type Need =
  | { kind: "hold"; pickupId: string; number: number; kindName: string; record: string; pickedUpOn: string }
  | { kind: "wrong-sums"; ticketId: string; number: string; yardName: string; ticketOn: string }
  | { kind: "draft"; ticketId: string; number: string; yardName: string; ticketOn: string }
  | { kind: "unpaid"; ticketId: string; number: string; yardName: string; days: number; leftMinor: number | null }
  | ({ kind: "sell-point"; best: BestPrice | null } & FullBin)
  | ({ kind: "stale-sheet"; days: number } & StaleSheet);

type Waiting = Awaited<ReturnType<typeof waitingTickets>>;

function ticketNeeds(ctx: Context, waiting: Waiting): Need[] {
  const money = seesTicketMoney(ctx.actor.role, ctx.outfit.hidesMoney);
  const wrong = waiting.filter((ticket) => ticket.paperSaysSo);
  const rest = waiting.filter((ticket) => !ticket.paperSaysSo);
  return [
    ...wrong.map(({ ticketId, number, yardName, ticketOn }): Need => ({ kind: "wrong-sums", ticketId, number, yardName, ticketOn })),
    ...rest.flatMap(({ ticketId, number, yardName, ticketOn, state, totalMinor, paidMinor }): Need[] =>
      state === "posted"
        ? [{ kind: "unpaid", ticketId, number, yardName, days: daysBetween(ticketOn, ctx.today), leftMinor: money ? totalMinor - paidMinor : null }]
        : [],
    ),
    ...rest.flatMap(({ ticketId, number, yardName, ticketOn, state }): Need[] =>
      state === "draft" ? [{ kind: "draft", ticketId, number, yardName, ticketOn }] : [],
    ),
  ];
}

async function needsOf(ctx: Context, shop: Shop): Promise<Need[]> {
  const db = database();
  const outfitId = ctx.outfit.id;
  const { role } = ctx.actor;
  const [held, waiting, full] = await Promise.all([
    heldItems(db, { outfitId }),
    can(role, "tickets.post") ? waitingTickets(db, { outfitId }) : [],
    fullBins(db, { outfitId }),
  ]);
  const stale =
    can(role, "prices.add") && seesPrices(role, ctx.outfit.hidesMoney)
      ? staleSheets(shop.prices, shop.best, addDays(ctx.today, -ctx.outfit.staleAfterDays))
      : [];
  return [
    ...held.map((item): Need => ({ kind: "hold", ...item, record: recordName(item.record) })),
    ...ticketNeeds(ctx, waiting),
    ...full.map((bin): Need => ({ kind: "sell-point", ...bin, best: shop.best.get(bin.gradeId) ?? null })),
    ...stale.map((sheet): Need => ({ kind: "stale-sheet", ...sheet, days: daysBetween(sheet.inForceFrom, ctx.today) })),
  ];
}

/** Everything Today shows but the hauls, which the pickups area reads. */
export async function getToday(ctx: Context) {
  const shop = await shopToday(ctx);
  const [needs, month] = await Promise.all([
    needsOf(ctx, shop),
    seesCost(ctx.actor.role) ? monthSoFar(database(), { outfitId: ctx.outfit.id, month: monthOf(ctx.today) }) : null,
  ]);
  return { standing: shop.standing, needs, month };
}
