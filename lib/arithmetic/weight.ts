import { exact, plain, roundedQuotient, type ExactNumber } from "./exact";
import type { DecimalString } from "./decimal";

/** Units an outfit may keep its weight book in. */
export const BOOK_UNITS = ["lb", "kg"] as const;
export type BookUnit = (typeof BOOK_UNITS)[number];

/** Units a weight may be entered in. `cwt` is 100 lb, `short-ton` 2,000 lb, `long-ton` (gross ton) 2,240 lb, `ozt` a troy ounce. */
export const WEIGHT_UNITS = ["lb", "kg", "oz", "g", "cwt", "short-ton", "long-ton", "tonne", "ozt"] as const;
export type WeightUnit = (typeof WEIGHT_UNITS)[number];

/** Decimals kept of a weight in the book unit. */
export const WEIGHT_PLACES = 4;

/** What one of each unit weighs in kilograms. Exact by definition: NIST Handbook 44, Appendix C. */
const KILOGRAMS: Record<WeightUnit, DecimalString> = {
  lb: "0.45359237",
  kg: "1",
  oz: "0.028349523125",
  g: "0.001",
  cwt: "45.359237",
  "short-ton": "907.18474",
  "long-ton": "1016.0469088",
  tonne: "1000",
  ozt: "0.0311034768",
};

/** Kilograms in one of a unit, exact. For the arithmetic of prices. */
export const kilogramsIn = (unit: WeightUnit): ExactNumber => exact(KILOGRAMS[unit]);

/** A weight in another unit, rounded once, half away from zero, to 0.0001 of that unit. */
export const convertWeight = (value: DecimalString, from: WeightUnit, to: WeightUnit): DecimalString =>
  plain(roundedQuotient(exact(value).times(kilogramsIn(from)), kilogramsIn(to), WEIGHT_PLACES));

/** Gross less tare less deduction, all in one unit. Below zero when the inputs say so: whoever asks decides what that means. */
export const netWeight = (weighed: { gross: DecimalString; tare: DecimalString; deduction?: DecimalString }): DecimalString =>
  plain(
    exact(weighed.gross)
      .minus(exact(weighed.tare))
      .minus(exact(weighed.deduction ?? "0")),
  );
