import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { divide } from "./decimal";
import { readNumber, type ReadNumberOptions } from "./read-number";

const LOCALES = ["en-US", "es-US", "fr-CA", "de-DE"];
const read = (typed: string, options: Partial<ReadNumberOptions> = {}) => {
  const result = readNumber(typed, { locale: "en-US", ...options });
  return result.ok ? result.value : result.reason;
};

const SAME_EVERYWHERE: [typed: string, understood: string][] = [
  ["0", "0"],
  ["12", "12"],
  ["12.5", "12.5"],
  ["12,5", "12.5"],
  ["12,50", "12.5"],
  ["12.05", "12.05"],
  ["1.2345", "1.2345"],
  ["1,2345", "1.2345"],
  ["0.125", "0.125"],
  ["0,125", "0.125"],
  [".5", "0.5"],
  [",5", "0.5"],
  [",125", "0.125"],
  ["5.", "5"],
  ["5,", "5"],
  ["007", "7"],
  ["1,234.5", "1234.5"],
  ["1.234,5", "1234.5"],
  ["1,234.567", "1234.567"],
  ["1.234,567", "1234.567"],
  ["1,234,567", "1234567"],
  ["1.234.567", "1234567"],
  ["1,234,567.89", "1234567.89"],
  ["1 234", "1234"],
  ["1\u00a0234,5", "1234.5"],
  ["1\u202f234,567", "1234.567"],
  ["1'234.5", "1234.5"],
  ["1’234’567", "1234567"],
  ["  12.5  ", "12.5"],
  ["\u00a012.5\u202f", "12.5"],
  ["+12.5", "12.5"],
  ["999999999999999", "999999999999999"],
  ["1,23,4", "not-a-number"],
  ["1,23,456", "not-a-number"],
  ["1,234,56", "not-a-number"],
  ["12 5", "not-a-number"],
  ["0,123,456", "not-a-number"],
  ["1,234 567", "not-a-number"],
  ["1.2.3", "not-a-number"],
  ["1..2", "not-a-number"],
  [".", "not-a-number"],
  [",", "not-a-number"],
  ["twelve", "not-a-number"],
  ["1e5", "not-a-number"],
  ["0x10", "not-a-number"],
  ["NaN", "not-a-number"],
  ["Infinity", "not-a-number"],
  ["12½", "not-a-number"],
  ["12²", "not-a-number"],
  ["١٢", "not-a-number"],
  ["１２", "not-a-number"],
  ["12-", "not-a-number"],
  ["--12", "not-a-number"],
  ["12/5", "not-a-number"],
  ["9".repeat(5000), "not-a-number"],
  ["", "empty"],
  ["   ", "empty"],
  ["\u00a0", "empty"],
  ["-5", "negative"],
  ["−5", "negative"],
  ["- 5", "negative"],
  ["1234567890123456", "too-large"],
  ["1.1234567890123", "too-many-decimals"],
];

describe("a typed number", () => {
  const cases = SAME_EVERYWHERE.flatMap(([typed, understood]) => LOCALES.map((locale) => [typed.slice(0, 30), locale, typed, understood]));

  it.each(cases)("%j in %s means the same everywhere", (_shown, locale, typed, understood) => {
    expect(read(typed ?? "", { locale })).toBe(understood);
  });

  it.each([
    ["1,234", "en-US", "1234"],
    ["1,234", "es-US", "1234"],
    ["1,234", "fr-CA", "1.234"],
    ["1,234", "de-DE", "1.234"],
    ["1.234", "en-US", "1.234"],
    ["1.234", "es-US", "1.234"],
    ["1.234", "fr-CA", "1.234"],
    ["1.234", "de-DE", "1234"],
    ["12,500", "en-US", "12500"],
    ["12.500", "de-DE", "12500"],
    ["1234,567", "en-US", "not-a-number"],
    ["1234,567", "de-DE", "1234.567"],
    ["1234.567", "en-US", "1234.567"],
    ["01,234", "en-US", "not-a-number"],
  ])("%j, which could be read two ways, follows %s", (typed, locale, understood) => {
    expect(read(typed, { locale })).toBe(understood);
  });

  it.each([
    ["12.5 lb", "12.5"],
    ["12.5lb", "12.5"],
    ["12.5 lbs", "12.5"],
    ["12.5 LB.", "12.5"],
    ["12,5\u00a0lb", "12.5"],
    ["1,234 lb", "1234"],
    ["2 short tons", "2"],
    ["2 short-ton", "2"],
    ["$3.85", "3.85"],
    ["$ 3.85", "3.85"],
    ["3,85 $", "3.85"],
    ["$3.85/lb", "3.85"],
    ["3.85 $/lb", "3.85"],
    ["USD 3.85", "3.85"],
    ["-$3.85", "negative"],
    ["$-3.85", "negative"],
    ["12.5 kg", "unknown-unit"],
    ["5 lb 4 oz", "not-a-number"],
    ["€3.85", "not-a-number"],
    ["$", "not-a-number"],
    ["lb", "not-a-number"],
  ])("%j may carry the unit and sign of its box: %s", (typed, understood) => {
    expect(read(typed, { units: ["lb", "short-ton"], currencySymbols: ["$", "USD"] })).toBe(understood);
  });

  it("carries no unit or sign into a box that has none", () => {
    expect(read("12.5 lb")).toBe("unknown-unit");
    expect(read("$3.85")).toBe("not-a-number");
  });

  it("has no more decimals than the box keeps, zeros aside", () => {
    expect(read("1.23456", { places: 4 })).toBe("too-many-decimals");
    expect(read("1.23450", { places: 4 })).toBe("1.2345");
    expect(read("2.5", { places: 0 })).toBe("too-many-decimals");
  });

  it("is read as it was written by Intl, in every locale", () => {
    const amount = fc.bigInt({ min: 0n, max: 10n ** 14n }).map((count) => divide(String(count), "10000", 4));
    fc.assert(
      fc.property(amount, fc.constantFrom(...LOCALES), fc.boolean(), (value, locale, useGrouping) => {
        const shown = new Intl.NumberFormat(locale, { maximumFractionDigits: 4, useGrouping }).format(value as Intl.StringNumericLiteral);
        // Without groups a locale's decimal mark is never its group mark, so both spellings are read alike.
        expect(read(shown, { locale })).toBe(value);
      }),
    );
  });

  it("is either a plain number of zero or more, or refused with a reason, whatever is typed", () => {
    const soup = fc.string({ unit: fc.constantFrom(..."0123456789.,' -+$lbkge\u00a0\u202f"), maxLength: 14 });
    fc.assert(
      fc.property(fc.oneof(soup, fc.string()), fc.constantFrom(...LOCALES), (typed, locale) => {
        const result = readNumber(typed, { locale, units: ["lb"], currencySymbols: ["$"] });
        if (result.ok) expect(result.value).toMatch(/^\d+(\.\d*[1-9])?$/);
        else expect(result.reason).toMatch(/^[a-z-]+$/);
      }),
      { numRuns: 1000 },
    );
  });
});
