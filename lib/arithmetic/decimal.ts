import { exact, isPlain, plain, rounded, roundedQuotient } from "./exact";

/**
 * Exact arithmetic on plain decimal strings such as "12.5", "-0.085" or "1284.6000": up to twenty digits on each side of the point, never
 * an exponent. Results carry no trailing zeros, except those of `fixed`. Every function throws a RangeError when given anything else.
 */
export type DecimalString = string;

/** Whether a text is a plain decimal number, as the API and the database write it. */
export const isDecimalString = (text: string): boolean => isPlain(text);

export const add = (a: DecimalString, b: DecimalString): DecimalString => plain(exact(a).plus(exact(b)));

/** a - b */
export const subtract = (a: DecimalString, b: DecimalString): DecimalString => plain(exact(a).minus(exact(b)));

export const negate = (a: DecimalString): DecimalString => plain(exact(a).neg());

/** The total of a list; of an empty one, "0". */
export const sum = (list: readonly DecimalString[]): DecimalString => plain(list.reduce((total, item) => total.plus(exact(item)), exact("0")));

/** -1 when a is less than b, 0 when they are equal however they are written, 1 when a is more. */
export const compare = (a: DecimalString, b: DecimalString): -1 | 0 | 1 => {
  const order = exact(a).comparedTo(exact(b));
  return order < 0 ? -1 : order > 0 ? 1 : 0;
};

export const isZero = (a: DecimalString): boolean => exact(a).isZero();

/** Below zero; zero itself is not. */
export const isNegative = (a: DecimalString): boolean => exact(a).lt(0);

/** Above zero; zero itself is not. */
export const isPositive = (a: DecimalString): boolean => exact(a).gt(0);

export const min = (a: DecimalString, b: DecimalString): DecimalString => plain(compare(a, b) <= 0 ? exact(a) : exact(b));

export const max = (a: DecimalString, b: DecimalString): DecimalString => plain(compare(a, b) >= 0 ? exact(a) : exact(b));

/** a x b, rounded once, half away from zero, to at most that many decimals. */
export const multiply = (a: DecimalString, b: DecimalString, places: number): DecimalString => plain(rounded(exact(a).times(exact(b)), places));

/** a / b, rounded once, half away from zero, to at most that many decimals. Throws a RangeError when b is zero. */
export const divide = (a: DecimalString, b: DecimalString, places: number): DecimalString => plain(roundedQuotient(exact(a), exact(b), places));

/** Half away from zero, to at most that many decimals. */
export const roundTo = (a: DecimalString, places: number): DecimalString => plain(rounded(exact(a), places));

/** Half away from zero, with always that many decimals: `fixed("12.5", 4)` is "12.5000". */
export const fixed = (a: DecimalString, places: number): DecimalString => {
  const value = rounded(exact(a), places);
  return (value.isZero() ? value.abs() : value).toFixed(places);
};

/** Without trailing zeros: the database writes "12.5000", people write 12.5. */
export const trim = (a: DecimalString): DecimalString => plain(exact(a));
