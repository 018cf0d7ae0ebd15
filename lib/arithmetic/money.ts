import type { DecimalString } from "./decimal";
import { exact, exactInteger } from "./exact";

/**
 * Currencies whose minor unit is not a hundredth, from ISO 4217. Kept here rather than asked of Intl, because browsers and Node disagree
 * (the forint has 2 in ISO and 0 in Node 20), and amounts already booked must not change by a factor of a hundred with an upgrade.
 */
const EXPONENTS: Record<string, number> = {
  ...Object.fromEntries("BIF CLP DJF GNF ISK JPY KMF KRW PYG RWF UGX UYI VND VUV XAF XOF XPF".split(" ").map((code) => [code, 0])),
  ...Object.fromEntries("BHD IQD JOD KWD LYD OMR TND".split(" ").map((code) => [code, 3])),
};

const accepted = new Set(Intl.supportedValuesOf("currency"));

/** Whether a text is the three-letter code, in capitals, of a currency an outfit may keep its books in. */
export const isCurrency = (code: string): boolean => accepted.has(code);

/**
 * Decimals of a currency: 2 for USD and CAD, 0 for JPY, 3 for KWD. Throws a RangeError for what cannot be a code. It does not ask `isCurrency`,
 * so that an old browser shows the money of a currency it has not heard of.
 */
export function currencyExponent(code: string): number {
  if (!/^[A-Z]{3}$/.test(code)) throw new RangeError(`Not a currency code: ${JSON.stringify(code).slice(0, 20)}`);
  return EXPONENTS[code] ?? 2;
}

/** Gives an amount back, or throws a RangeError when it is no whole number or too large to be held exactly. */
export function assertSafeMinor(amount: number): number {
  if (!Number.isSafeInteger(amount)) throw new RangeError(`Not a safe amount in minor units: ${amount}`);
  // A negative zero would be shown with a sign.
  return amount === 0 ? 0 : amount;
}

/** The total of amounts in minor units. Throws a RangeError past what can be held exactly; of nothing, 0. */
export const addMinor = (...amounts: number[]): number =>
  assertSafeMinor(Number(amounts.reduce((total, amount) => total + BigInt(assertSafeMinor(amount)), 0n)));

/**
 * An amount in major units ("12.5") as minor units (1250), exactly; null when it has more decimals than the currency. Throws a RangeError
 * for what is no decimal, or too large.
 */
export function minorFromDecimal(text: DecimalString, exponent: number): number | null {
  const minor = exact(text).times(exactInteger(10).pow(exponent));
  return minor.isInteger() ? assertSafeMinor(minor.toNumber()) : null;
}

/** Minor units (1250) as major units with all the currency's decimals ("12.50"). */
export const decimalFromMinor = (minor: number, exponent: number): DecimalString =>
  exactInteger(assertSafeMinor(minor)).div(exactInteger(10).pow(exponent)).toFixed(exponent);

/** What is paid in cash where the smallest coin is `step` minor units: the nearest multiple, half away from zero. */
export function roundCash(minor: number, step = 5): number {
  const size = Math.abs(assertSafeMinor(minor));
  const rest = size % step;
  const paid = size - rest + (rest * 2 >= step ? step : 0);
  return assertSafeMinor(minor < 0 ? -paid : paid);
}
