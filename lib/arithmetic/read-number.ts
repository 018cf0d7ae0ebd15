import { isNegative, trim, type DecimalString } from "./decimal";

/** Why a typed number was not understood. */
export type ReadNumberProblem = "empty" | "not-a-number" | "negative" | "too-many-decimals" | "too-large" | "unknown-unit";

export type ReadNumber = { ok: true; value: DecimalString } | { ok: false; reason: ReadNumberProblem };

export type ReadNumberOptions = {
  /** Settles what "1,234" means, and nothing else. */
  locale: string;
  /** Units that may be typed behind the number: `["lb"]` takes "12.5 lb", "12.5lbs" and "3.85/lb". */
  units?: readonly string[];
  /** Currency signs or codes that may be typed before or behind it. */
  currencySymbols?: readonly string[];
  /** Most decimals that mean something here. */
  places?: number;
};

const LONGEST = 60;
const MOST_WHOLE_DIGITS = 15;
const MOST_PLACES = 12;
/** Space, no-break, figure, thin and narrow no-break space. */
const SPACES = /[ \t\u00a0\u2007\u2009\u202f]/g;

const groupMarks = new Map<string, string>();

/** What a locale writes between groups of three digits. Its decimal mark never matters: any mark that is not this one is decimal. */
function groupMark(locale: string): string {
  const known = groupMarks.get(locale);
  if (known !== undefined) return known;
  const mark = new Intl.NumberFormat(locale).formatToParts(1_234_567).find((part) => part.type === "group")?.value ?? "";
  groupMarks.set(locale, mark);
  return mark;
}

/** Digits in groups of exactly three under one mark, joined; null when they are not. */
function joinGroups(runs: string[], marks: string[]): string | null {
  const [first = "", ...others] = runs;
  if (new Set(marks).size > 1 || others.some((run) => run.length !== 3)) return null;
  if (others.length > 0 && !/^[1-9]\d{0,2}$/.test(first)) return null;
  return runs.join("");
}

/** Splits what is typed into whole digits and decimals; null when it can be read in no way, or in two. */
function readDigits(text: string, locale: string): { whole: string; decimals: string } | null {
  if (!/^\d*(?:[.,' ]\d*)*$/.test(text) || !/\d/.test(text)) return null;
  const marks: string[] = text.match(/[.,' ]/g) ?? [];
  const runs = text.split(/[.,' ]/);
  const last = marks.at(-1);
  const couldBeDecimal = (last === "." || last === ",") && marks.indexOf(last) === marks.length - 1;
  const [whole = "", after = ""] = runs;
  // "0,125" and ",125" cannot be groups, so only a number that could be either is settled by the locale.
  const couldBeGroup = marks.length === 1 && after.length === 3 && whole !== "" && whole !== "0" && last === groupMark(locale);
  if (couldBeDecimal && !couldBeGroup) {
    const joined = joinGroups(runs.slice(0, -1), marks.slice(0, -1));
    return joined === null ? null : { whole: joined, decimals: runs.at(-1) ?? "" };
  }
  const joined = joinGroups(runs, marks);
  return joined === null ? null : { whole: joined, decimals: "" };
}

function withoutCurrency(text: string, symbols: readonly string[]): string {
  const longestFirst = [...symbols].filter(Boolean).sort((a, b) => b.length - a.length);
  const before = longestFirst.find((symbol) => text.startsWith(symbol));
  if (before !== undefined) return text.slice(before.length).trim();
  const behind = longestFirst.find((symbol) => text.endsWith(symbol));
  return behind === undefined ? text : text.slice(0, -behind.length).trim();
}

function withoutUnit(text: string, units: readonly string[]): string {
  const [, number, unit = ""] = /^(.*?\d.*?)\s*\/?\s*(\p{L}[\p{L}\s-]*)[.]?$/u.exec(text) ?? [];
  if (number === undefined) return text;
  const said = unit.toLowerCase().replaceAll("-", " ").trim();
  const known = units.map((name) => name.toLowerCase().replaceAll("-", " "));
  return known.some((name) => said === name || said === `${name}s`) ? number : text;
}

/**
 * Reads a weight, price or count as people type it, strictly: a misread comma is a weight ten times too large. Groups count only in exact
 * threes; a lone comma or point that is not followed by exactly three digits is the decimal mark in every language; "1,234" follows the locale;
 * "1,23,4" and "12 5" are refused. The value is never negative and carries no trailing zeros.
 */
export function readNumber(typed: string, options: ReadNumberOptions): ReadNumber {
  const { locale, units = [], currencySymbols = [], places = MOST_PLACES } = options;
  if (typed.length > LONGEST) return { ok: false, reason: "not-a-number" };
  const text = typed.replace(SPACES, " ").trim();
  if (text === "") return { ok: false, reason: "empty" };
  const signed = withoutCurrency(withoutUnit(withoutCurrency(text, currencySymbols), units), currencySymbols);
  const [, sign = "", rest = ""] = /^([-−+]?) ?(.*)$/.exec(signed) ?? [];
  const number = withoutCurrency(rest, currencySymbols).replaceAll("’", "'");
  const digits = readDigits(number, locale);
  if (!digits) return { ok: false, reason: /^[\d.,' ]*\d[\d.,' ]*\p{L}+$/u.test(number) ? "unknown-unit" : "not-a-number" };
  const whole = digits.whole.replace(/^0+(?=\d)/, "") || "0";
  const decimals = digits.decimals.replace(/0+$/, "");
  if (whole.length > MOST_WHOLE_DIGITS) return { ok: false, reason: "too-large" };
  if (decimals.length > places) return { ok: false, reason: "too-many-decimals" };
  const value = trim(`${sign === "" || sign === "+" ? "" : "-"}${whole}${decimals && `.${decimals}`}`);
  return isNegative(value) ? { ok: false, reason: "negative" } : { ok: true, value };
}
