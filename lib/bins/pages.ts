import "server-only";
import { database } from "@/db/client";
import { divide, isZero, multiply, roundTo } from "@/lib/arithmetic/decimal";
import { lineAmount } from "@/lib/arithmetic/price";
import { decimalFromMinor } from "@/lib/arithmetic/money";
import type { Context } from "@/lib/auth/context";
import { seesCost, seesPrices } from "@/lib/auth/permissions";
import { daysBetween } from "@/lib/clock";
import { bestOf, pricesInForce } from "@/lib/prices/queries";
import { getBin, gradeStockList, listBins, listCounts, listWeighIns, openLots, type GradeHolding } from "./queries";
import type { Bin } from "./schema";

/** How many weigh-ins back the pickers look for what was used last. */
const RECENT = 40;

/** What the weigh-in screen needs: bins with what they hold, the grades used last first, hauls with weight left, and today's weigh-ins. */
export async function weighInScreen(ctx: Context) {
  const db = database();
  const outfitId = ctx.outfit.id;
  const [bins, recent, lots] = await Promise.all([binsInUse(ctx), listWeighIns(db, { outfitId, limit: RECENT }), openLots(db, { outfitId })]);
  const order = new Map<string, number>();
  for (const weighIn of recent.items) if (!order.has(weighIn.gradeId)) order.set(weighIn.gradeId, order.size);
  const grades = new Map<string, { id: string; name: string; family: Bin["family"] }>();
  for (const bin of bins) grades.set(bin.gradeId, { id: bin.gradeId, name: bin.gradeName, family: bin.family });
  return {
    bins,
    grades: [...grades.values()].toSorted((a, b) => (order.get(a.id) ?? RECENT) - (order.get(b.id) ?? RECENT)),
    lots: lots.map(({ pickupId, number, place, remainingWeight }) => ({ id: pickupId, number, place, remainingWeight })),
    today: recent.items.filter((weighIn) => weighIn.weighedOn === ctx.today),
  };
}

/** A grade's row on the bins page. What the member may not see is null. */
export type BinsRow = Omit<GradeHolding, "costMinor"> & {
  averageCost: string | null;
  /** What the stock of the grade cost. */
  costMinor: number | null;
  best: { price: string; yardName: string; ageDays: number; stale: boolean } | null;
  valueMinor: number | null;
  daysHeld: number | null;
  /** Whole percent of the sell point. */
  percent: number | null;
};

function rowOf(ctx: Context, holding: GradeHolding, best: ReturnType<typeof bestOf>): BinsRow {
  const { costMinor, ...rest } = holding;
  const { exponent, weightUnit, staleAfterDays } = ctx.outfit;
  const price = best.get(holding.gradeId);
  const ageDays = price ? daysBetween(price.inForceFrom, ctx.today) : 0;
  const empty = isZero(holding.quantity);
  return {
    ...rest,
    averageCost: seesCost(ctx.actor.role) && !empty ? divide(decimalFromMinor(costMinor, exponent), holding.quantity, 4) : null,
    costMinor: seesCost(ctx.actor.role) ? costMinor : null,
    best: price ? { price: roundTo(price.normalised, 4), yardName: price.yardName, ageDays, stale: ageDays > staleAfterDays } : null,
    valueMinor: price ? lineAmount({ quantity: holding.quantity, unit: weightUnit, price: price.price, per: price.per, exponent }) : null,
    daysHeld: holding.heldSince === null ? null : daysBetween(holding.heldSince, ctx.today),
    percent:
      holding.sellPoint === null || isZero(holding.sellPoint) ? null : Number.parseInt(divide(multiply(holding.quantity, "100", 4), holding.sellPoint, 0), 10),
  };
}

/** The bins page: what is held of each grade, and, of the chosen grade, where it stands and what each yard pays. */
export async function binsScreen(ctx: Context, chosenId: string | undefined) {
  const db = database();
  const outfitId = ctx.outfit.id;
  const [holdings, bins, prices] = await Promise.all([
    gradeStockList(db, { outfitId }),
    listBins(db, { outfitId }),
    seesPrices(ctx.actor.role, ctx.outfit.hidesMoney) ? pricesInForce(db, { outfitId, on: ctx.today }) : [],
  ]);
  const best = bestOf(prices);
  const rows = holdings.map((holding) => rowOf(ctx, holding, best));
  const chosen = rows.find((row) => row.gradeId === chosenId) ?? null;
  const { exponent, weightUnit } = ctx.outfit;
  const yards = chosen
    ? prices
        .filter((price) => price.gradeId === chosen.gradeId && price.per !== "each")
        .map(({ yardId, yardName, inForceFrom, price, per, normalised }) => ({
          yardId,
          yardName,
          inForceFrom,
          price: roundTo(normalised ?? "0", 4),
          ageDays: daysBetween(inForceFrom, ctx.today),
          soldMinor: lineAmount({ quantity: chosen.quantity, unit: weightUnit, price, per, exponent }),
        }))
        .toSorted((a, b) => b.soldMinor - a.soldMinor)
    : [];
  return { rows, chosen, yards, bins: bins.filter((bin) => bin.gradeId === chosen?.gradeId), binCount: bins.length };
}

/** One bin with its last weigh-ins and counts, or null. */
export async function binScreen(ctx: Context, id: string) {
  const db = database();
  const outfitId = ctx.outfit.id;
  const bin = await getBin(db, { outfitId, id });
  if (!bin) return null;
  const [weighIns, counts] = await Promise.all([listWeighIns(db, { outfitId, binId: id, limit: 15 }), listCounts(db, { outfitId, binId: id, limit: 10 })]);
  return { bin, weighIns: weighIns.items, counts: counts.items };
}

/** Every bin in use, for pickers. */
export async function binsInUse(ctx: Context): Promise<Bin[]> {
  return (await listBins(database(), { outfitId: ctx.outfit.id })).filter((bin) => bin.putAwayAt === null);
}
