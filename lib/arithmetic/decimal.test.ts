import fc from "fast-check";
import { describe, expect, it } from "vitest";
import * as decimal from "./decimal";

const anyDecimal = fc
  .tuple(fc.boolean(), fc.bigInt({ min: 0n, max: 10n ** 12n }), fc.stringMatching(/^\d{0,8}$/))
  .map(([negative, whole, places]) => `${negative ? "-" : ""}${whole}${places && `.${places}`}`);

describe("decimal strings", () => {
  it.each(["0", "12.5", "-0.085", "1284.6000", "007", "99999999999999999999.99999999999999999999"])("%s is a plain decimal", (text) => {
    expect(decimal.isDecimalString(text)).toBe(true);
  });

  it.each(["", " 1", "1.", ".5", "1e5", "NaN", "Infinity", "--1", "+1", "1,5", "0x10", "١", "1\n", "1".repeat(21), `0.${"1".repeat(21)}`])(
    "%j is refused everywhere",
    (text) => {
      expect(decimal.isDecimalString(text)).toBe(false);
      expect(() => decimal.add(text, "1")).toThrow(RangeError);
    },
  );

  it("never shows the error of binary floats", () => {
    expect(decimal.add("0.1", "0.2")).toBe("0.3");
    expect(decimal.multiply("1.005", "100", 2)).toBe("100.5");
    expect(decimal.subtract("0.3", "0.1")).toBe("0.2");
  });

  it("never writes an exponent, however small or large", () => {
    expect(decimal.multiply("0.00000001", "0.00000001", 16)).toBe("0.0000000000000001");
    expect(decimal.multiply("10000000000000", "100000", 0)).toBe("1000000000000000000");
  });

  it("has no negative zero", () => {
    expect(decimal.negate("0")).toBe("0");
    expect(decimal.roundTo("-0.001", 2)).toBe("0");
    expect(decimal.fixed("-0.001", 2)).toBe("0.00");
    expect(decimal.isNegative("-0")).toBe(false);
  });

  it("compares values, not spellings", () => {
    expect(decimal.compare("12.5000", "12.5")).toBe(0);
    expect(decimal.compare("9", "10")).toBe(-1);
    expect(decimal.compare("-9", "-10")).toBe(1);
    expect([decimal.min("2", "10"), decimal.max("2", "10")]).toEqual(["2", "10"]);
  });

  it("trims what the database pads and pads what a column needs", () => {
    expect(decimal.trim("12.5000")).toBe("12.5");
    expect(decimal.trim("100")).toBe("100");
    expect(decimal.fixed("12.5", 4)).toBe("12.5000");
  });

  it("tells the sign of a number", () => {
    expect([decimal.isPositive("0.0001"), decimal.isPositive("0"), decimal.isNegative("-0.0001"), decimal.isZero("0.0000")]).toEqual([true, false, true, true]);
  });

  it("sums nothing to zero", () => {
    expect(decimal.sum([])).toBe("0");
    expect(decimal.sum(["1.5", "2.25", "-0.75"])).toBe("3");
  });

  it("refuses to divide by zero", () => {
    expect(() => decimal.divide("1", "0.000", 2)).toThrow(RangeError);
  });

  it("rounds a quotient once: what lies a hair under a half goes down", () => {
    expect(decimal.divide("1", "3", 4)).toBe("0.3333");
    expect(decimal.divide("2", "3", 4)).toBe("0.6667");
    expect(decimal.divide("-1", "8", 2)).toBe("-0.13");
    expect(decimal.divide("0.49999999999999999999", "1", 0)).toBe("0");
  });

  it("gives back what was added when it is taken away again", () => {
    fc.assert(
      fc.property(anyDecimal, anyDecimal, (a, b) => {
        expect(decimal.compare(decimal.subtract(decimal.add(a, b), b), a)).toBe(0);
        expect(decimal.sum([a, b, decimal.negate(a), decimal.negate(b)])).toBe("0");
      }),
    );
  });

  it("rounds to a number no further away than half of the last place, and equally for both signs", () => {
    fc.assert(
      fc.property(anyDecimal, fc.nat(6), (a, places) => {
        const rounded = decimal.roundTo(a, places);
        const off = decimal.subtract(rounded, a);
        const half = decimal.divide("0.5", String(10 ** places), 12);
        expect(decimal.compare(decimal.max(off, decimal.negate(off)), half)).toBeLessThanOrEqual(0);
        expect(decimal.roundTo(decimal.negate(a), places)).toBe(decimal.negate(rounded));
      }),
    );
  });
});
