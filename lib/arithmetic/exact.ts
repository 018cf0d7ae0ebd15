import { Decimal } from "decimal.js";

/**
 * The exact numbers behind every other file here. Used inside lib/arithmetic only: the rest of the app sees plain strings and whole minor
 * units. A clone of its own, so that nobody can change the precision of the books by setting decimal.js's defaults.
 */
const Exact = Decimal.clone({ precision: 80, rounding: Decimal.ROUND_HALF_UP, toExpNeg: -9e15, toExpPos: 9e15 });

export type ExactNumber = Decimal;

/** Twenty digits on each side: two such numbers multiply to eighty digits at most, so products stay exact. */
const PLAIN = /^-?\d{1,20}(\.\d{1,20})?$/;

export const isPlain = (text: string): boolean => PLAIN.test(text);

/** Reads a plain decimal string. Throws a RangeError for anything else: what people type goes through `readNumber` first. */
export function exact(text: string): ExactNumber {
  if (!isPlain(text)) throw new RangeError(`Not a plain decimal number: ${JSON.stringify(text).slice(0, 60)}`);
  return new Exact(text);
}

/** A whole number that JavaScript holds exactly. */
export const exactInteger = (value: number): ExactNumber => new Exact(value);

/** Writes without exponent, without trailing zeros and without a negative zero. */
export const plain = (value: ExactNumber): string => (value.isZero() ? "0" : value.toFixed());

/** Half away from zero. */
export const rounded = (value: ExactNumber, places: number): ExactNumber => value.toDecimalPlaces(places, Decimal.ROUND_HALF_UP);

/**
 * `numerator / denominator` rounded half away from zero, in one step: the remainder decides, so a quotient that never ends is not cut off
 * before it is rounded. Throws a RangeError when the denominator is zero.
 */
export function roundedQuotient(numerator: ExactNumber, denominator: ExactNumber, places: number): ExactNumber {
  if (denominator.isZero()) throw new RangeError("Cannot divide by zero.");
  const unit = new Exact(10).pow(places);
  const scaled = numerator.times(unit);
  const whole = scaled.divToInt(denominator);
  const rest = scaled.minus(whole.times(denominator)).abs();
  const sign = numerator.isNegative() === denominator.isNegative() ? 1 : -1;
  const nearest = rest.times(2).gte(denominator.abs()) ? whole.plus(sign) : whole;
  return nearest.div(unit);
}
