import { compare, fixed, isZero, max, negate, roundTo, type DecimalString } from "@/lib/arithmetic/decimal";
import { currencyExponent, decimalFromMinor } from "@/lib/arithmetic/money";

/**
 * How numbers, dates and times are written on every screen. Numbers go to Intl as decimal strings, which it rounds half away from zero without
 * ever making a binary float of them.
 */

const LOCALE = "en-US";
const DASH = "–";

/** Making a formatter costs far more than using it, and a table uses the same one in every row. */
const numberFormats = new Map<string, Intl.NumberFormat>();
function numberFormat(locale: string, options: Intl.NumberFormatOptions): Intl.NumberFormat {
  const key = locale + JSON.stringify(options);
  const made = numberFormats.get(key) ?? new Intl.NumberFormat(locale, options);
  numberFormats.set(key, made);
  return made;
}

const dateFormats = new Map<string, Intl.DateTimeFormat>();
function dateFormat(locale: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = locale + JSON.stringify(options);
  const made = dateFormats.get(key) ?? new Intl.DateTimeFormat(locale, options);
  dateFormats.set(key, made);
  return made;
}

type NumberOptions = {
  /** Writes + before a gain as well; a zero stays bare. */
  sign?: boolean;
  locale?: string;
};

/** A true minus, because the hyphen is too short to be seen beside figures. */
function writeNumber(value: DecimalString, { sign = false, locale = LOCALE }: NumberOptions, options: Intl.NumberFormatOptions): string {
  return numberFormat(locale, { signDisplay: sign ? "exceptZero" : "negative", ...options })
    .formatToParts(value as Intl.StringNumericLiteral)
    .map((part) => (part.type === "minusSign" ? "−" : part.value))
    .join("");
}

const decimals = (places: number) => ({ minimumFractionDigits: places, maximumFractionDigits: places });

/** A weight without its unit: "1,284.6". One decimal in ledgers; ask for two on the bench scale. Not yet weighed (null) is a dash, not zero. */
export const formatWeight = (value: DecimalString | null, { places = 1, ...options }: NumberOptions & { places?: number } = {}): string =>
  value === null ? DASH : writeNumber(value, options, decimals(places));

/** A weight with its unit: "1,284.6 lb". Takes units as they are stored and writes "short-ton" as "short ton". */
export const formatWeightUnit = (value: DecimalString | null, unit: string, options: NumberOptions & { places?: number } = {}): string =>
  value === null ? DASH : `${formatWeight(value, options)} ${unit.replaceAll("-", " ")}`;

type MoneyOptions = NumberOptions & {
  /** Whole dollars, for the line at the top of a screen. */
  whole?: boolean;
};

function writeMoney(minor: number, currency: string, { whole = false, ...options }: MoneyOptions, more: Intl.NumberFormatOptions): string {
  const exponent = currencyExponent(currency);
  return writeNumber(decimalFromMinor(minor, exponent), options, { ...decimals(whole ? 0 : exponent), ...more });
}

/** Money with its sign: "$2,309.95", "−$1.80", and "+$493.67" for a change. The outfit has one currency, so its short sign says enough. */
export const formatMoney = (minor: number, currency: string, options: MoneyOptions = {}): string =>
  writeMoney(minor, currency, options, { style: "currency", currency, currencyDisplay: "narrowSymbol" });

/** Money in a table, where the currency's sign sits in the column's head: "2,309.95". */
export const formatMoneyPlain = (minor: number, currency: string, options: MoneyOptions = {}): string => writeMoney(minor, currency, options, {});

/**
 * A price without its currency: "4.02"; three decimals where the third says something, or the price is below ten cents ("0.085"). A zero price is
 * "0.00".
 */
export function formatPrice(price: DecimalString, options: NumberOptions = {}): string {
  const third = !fixed(price, 3).endsWith("0");
  const small = !isZero(price) && compare(max(price, negate(price)), "0.1") < 0;
  return writeNumber(price, options, decimals(third || small ? 3 : 2));
}

/** A share given as a fraction: "0.893" is "89.3%". */
export const formatPercent = (fraction: DecimalString, { places = 1, ...options }: NumberOptions & { places?: number } = {}): string =>
  writeNumber(roundTo(fraction, 12), options, { style: "percent", ...decimals(places) });

type DateOptions = {
  /** Today's date: its year is not written. */
  today?: string;
  locale?: string;
};

/** Calendar dates have no time zone, so they are read and written in the same one. */
const noon = (date: string) => new Date(`${date}T12:00:00Z`);

/** "Nov 29"; with the year when `today` lies in another: "Nov 29, 2025". */
export function formatShortDate(date: string, { today, locale = LOCALE }: DateOptions = {}): string {
  const otherYear = today !== undefined && today.slice(0, 4) !== date.slice(0, 4);
  return dateFormat(locale, { month: "short", day: "numeric", timeZone: "UTC", ...(otherYear ? { year: "numeric" } : {}) }).format(noon(date));
}

/** "Sat Nov 29"; with the year when `today` lies in another. */
export const formatDate = (date: string, options: DateOptions = {}): string =>
  `${dateFormat(options.locale ?? LOCALE, { weekday: "short", timeZone: "UTC" }).format(noon(date))} ${formatShortDate(date, options)}`;

/** A month, `YYYY-MM`, in full: "November 2026". */
export const formatMonth = (month: string, { locale = LOCALE }: { locale?: string } = {}): string =>
  dateFormat(locale, { month: "long", year: "numeric", timeZone: "UTC" }).format(noon(`${month}-01`));

/** The time of day in a time zone, by the 24-hour clock: "7:42", "14:05". Takes a Date or an ISO instant. */
export function formatTime(instant: Date | string, timeZone: string, { locale = LOCALE }: { locale?: string } = {}): string {
  const moment = typeof instant === "string" ? new Date(instant) : instant;
  return dateFormat(locale, { hour: "2-digit", minute: "2-digit", hourCycle: "h23", timeZone })
    .format(moment)
    .replace(/^0(?=\d)/, "");
}

/** How long ago, in days: "9 d". */
export const formatAge = (days: number): string => `${days} d`;
