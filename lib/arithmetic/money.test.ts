import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { addMinor, assertSafeMinor, currencyExponent, decimalFromMinor, isCurrency, minorFromDecimal, roundCash } from "./money";

const minor = fc.integer({ min: -10_000_000_000, max: 10_000_000_000 });

describe("currencies", () => {
  it.each([
    ["USD", 2],
    ["CAD", 2],
    ["MXN", 2],
    ["GBP", 2],
    ["JPY", 0],
    ["KWD", 3],
    ["HUF", 2],
  ])("%s has %i decimals, by ISO 4217", (code, exponent) => {
    expect(currencyExponent(code)).toBe(exponent);
  });

  it.each(["usd", "US", "DOLLAR", "XXX", "", "BTC", "toString"])("%j is no currency", (code) => {
    expect(isCurrency(code)).toBe(false);
  });
});

describe("currency exponents", () => {
  it("are refused for what cannot be a code, and known for every currency an outfit may choose", () => {
    for (const code of ["usd", "US", "DOLLAR", "", "toString"]) expect(() => currencyExponent(code)).toThrow(RangeError);
    for (const code of Intl.supportedValuesOf("currency")) expect([0, 2, 3]).toContain(currencyExponent(code));
  });
});

describe("amounts", () => {
  it("add up exactly, or not at all", () => {
    expect(addMinor()).toBe(0);
    expect(addMinor(1, -3, 2)).toBe(0);
    expect(addMinor(Number.MAX_SAFE_INTEGER, 5, -5)).toBe(Number.MAX_SAFE_INTEGER);
    expect(() => addMinor(Number.MAX_SAFE_INTEGER, 1)).toThrow(RangeError);
    expect(() => addMinor(-Number.MAX_SAFE_INTEGER, -1)).toThrow(RangeError);
  });

  it.each([0.5, Number.NaN, Number.POSITIVE_INFINITY, 2 ** 53])("%d is no amount", (value) => {
    expect(() => assertSafeMinor(value)).toThrow(RangeError);
    expect(() => addMinor(1, value)).toThrow(RangeError);
  });

  it("have no negative zero", () => {
    expect(Object.is(assertSafeMinor(-0), 0)).toBe(true);
  });

  it("come from a decimal exactly, or not at all", () => {
    expect(minorFromDecimal("12.5", 2)).toBe(1250);
    expect(minorFromDecimal("12.5000", 2)).toBe(1250);
    expect(minorFromDecimal("-0.01", 2)).toBe(-1);
    expect(minorFromDecimal("12.345", 2)).toBeNull();
    expect(minorFromDecimal("12.5", 0)).toBeNull();
    expect(() => minorFromDecimal("90071992547409.93", 2)).toThrow(RangeError);
    expect(() => minorFromDecimal("a lot", 2)).toThrow(RangeError);
  });

  it("are the same after being written and read again, in every currency", () => {
    fc.assert(
      fc.property(minor, fc.nat(4), (amount, exponent) => {
        expect(minorFromDecimal(decimalFromMinor(amount, exponent), exponent)).toBe(amount);
      }),
    );
  });

  it("are written with all decimals of the currency", () => {
    expect([decimalFromMinor(230_995, 2), decimalFromMinor(-5, 2), decimalFromMinor(7, 0), decimalFromMinor(0, 3)]).toEqual(["2309.95", "-0.05", "7", "0.000"]);
  });

  it("in cash are the nearest multiple of the smallest coin", () => {
    fc.assert(
      fc.property(minor, fc.constantFrom(1, 5, 10, 20, 50), (amount, step) => {
        const paid = roundCash(amount, step);
        expect(Math.abs(paid % step)).toBe(0);
        expect(Math.abs(paid - amount) * 2).toBeLessThanOrEqual(step);
        expect(roundCash(0 - amount, step)).toBe(0 - paid);
      }),
    );
  });
});
