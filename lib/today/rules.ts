import { compare, isPositive, sum, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import { lineAmount, type PriceUnit } from "@/lib/arithmetic/price";

/** What the outfit holds of one grade in its bins. */
export type Holding = { gradeId: string; family: string; quantity: DecimalString };

type Price = { price: DecimalString; per: PriceUnit };
export type Terms = { weightUnit: "lb" | "kg"; exponent: number };

/** What stands in the shop, by family. `valueMinor` is 0 where no yard has a price. */
export type Standing = {
  families: { family: string; quantity: DecimalString; valueMinor: number }[];
  quantity: DecimalString;
  valueMinor: number;
  /** Grades in the bins that no yard has a price for. */
  unpriced: number;
};

/** Values what is held at the best price of each grade, rounded once a grade; families and the total are sums of those. */
export function standingOf(holdings: Holding[], best: ReadonlyMap<string, Price>, terms: Terms): Standing {
  const held = holdings.filter((holding) => isPositive(holding.quantity));
  const valued = held.map((holding) => {
    const price = best.get(holding.gradeId);
    return { ...holding, valueMinor: price ? lineAmount({ quantity: holding.quantity, unit: terms.weightUnit, ...price, exponent: terms.exponent }) : null };
  });
  const families = [...new Set(valued.map((one) => one.family))].map((family) => {
    const own = valued.filter((one) => one.family === family);
    return { family, quantity: trim(sum(own.map((one) => one.quantity))), valueMinor: addMinor(...own.map((one) => one.valueMinor ?? 0)) };
  });
  return {
    families,
    quantity: trim(sum(held.map((one) => one.quantity))),
    valueMinor: addMinor(...families.map((one) => one.valueMinor)),
    unpriced: valued.filter((one) => one.valueMinor === null).length,
  };
}

/** A bin that holds what the outfit wants to sell at. */
export type FullBin = { binId: string; label: string; gradeId: string; gradeName: string; quantity: DecimalString; sellPoint: DecimalString };

/** Whether a bin holds as much as its sell point. */
export const atSellPoint = (bin: { quantity: DecimalString; sellPoint: DecimalString }): boolean =>
  isPositive(bin.sellPoint) && compare(bin.quantity, bin.sellPoint) >= 0;

type SheetPrice = { gradeId: string; yardId: string; yardName: string; sheetId: string; inForceFrom: string };
export type StaleSheet = { yardId: string; yardName: string; inForceFrom: string; leaning: number };

/** Sheets in force that started before `freshFrom`, with how many best prices lean on each; the oldest first. */
export function staleSheets(prices: SheetPrice[], best: ReadonlyMap<string, { sheetId: string }>, freshFrom: string): StaleSheet[] {
  const sheets = new Map<string, StaleSheet>();
  for (const { gradeId, yardId, yardName, sheetId, inForceFrom } of prices) {
    if (inForceFrom >= freshFrom) continue;
    const known = sheets.get(sheetId) ?? { yardId, yardName, inForceFrom, leaning: 0 };
    sheets.set(sheetId, { ...known, leaning: known.leaning + (best.get(gradeId)?.sheetId === sheetId ? 1 : 0) });
  }
  return [...sheets.values()].sort((a, b) => (a.inForceFrom < b.inForceFrom ? -1 : 1));
}
