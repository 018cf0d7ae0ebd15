import type { DecimalString } from "./decimal";
import { exact, exactInteger, plain, roundedQuotient } from "./exact";
import { assertSafeMinor } from "./money";
import { kilogramsIn, type BookUnit, type WeightUnit } from "./weight";

/** What a yard may quote a price per. */
export const PRICE_UNITS = ["lb", "kg", "cwt", "short-ton", "long-ton", "tonne", "ozt", "each"] as const;
export type PriceUnit = (typeof PRICE_UNITS)[number];

/** Decimals kept of a price in the book unit. */
export const NORMAL_PRICE_PLACES = 12;

/**
 * What a line comes to, in minor units: quantity x price, rounded once, half away from zero. Everything is multiplied first and divided last,
 * so a price per long ton on a weight in kilograms is as exact as one per pound on pounds. A price per `each` counts pieces and needs them.
 */
export function lineAmount(line: {
  quantity: DecimalString;
  /** The unit the quantity is in. */
  unit: WeightUnit;
  price: DecimalString;
  per: PriceUnit;
  /** Decimals of the currency. */
  exponent: number;
  pieces?: number | null;
}): number {
  const minorUnits = exactInteger(10).pow(line.exponent);
  if (line.per === "each") {
    if (line.pieces == null || !Number.isSafeInteger(line.pieces)) throw new RangeError("A price for each needs the number of pieces.");
    return assertSafeMinor(roundedQuotient(exactInteger(line.pieces).times(exact(line.price)).times(minorUnits), exact("1"), 0).toNumber());
  }
  const numerator = exact(line.quantity).times(kilogramsIn(line.unit)).times(exact(line.price)).times(minorUnits);
  return assertSafeMinor(roundedQuotient(numerator, kilogramsIn(line.per), 0).toNumber());
}

/**
 * A quoted price as money per book unit, to twelve decimals, for showing and sorting beside others. Null for a price per `each`, which no
 * weight can be compared with.
 */
export function normalisePrice(price: DecimalString, per: PriceUnit, bookUnit: BookUnit): DecimalString | null {
  if (per === "each") return null;
  return plain(roundedQuotient(exact(price).times(kilogramsIn(bookUnit)), kilogramsIn(per), NORMAL_PRICE_PLACES));
}

/** -1, 0 or 1 as the first price is lower than, equal to or higher than the second, exactly; null when one is per `each` and the other is not. */
export function comparePrices(a: { price: DecimalString; per: PriceUnit }, b: { price: DecimalString; per: PriceUnit }): -1 | 0 | 1 | null {
  if ((a.per === "each") !== (b.per === "each")) return null;
  const first = exact(a.price).times(b.per === "each" ? exact("1") : kilogramsIn(b.per));
  const second = exact(b.price).times(a.per === "each" ? exact("1") : kilogramsIn(a.per));
  return first.lt(second) ? -1 : first.gt(second) ? 1 : 0;
}
