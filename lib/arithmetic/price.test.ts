import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { comparePrices, lineAmount, normalisePrice, NORMAL_PRICE_PLACES, PRICE_UNITS } from "./price";
import { WEIGHT_UNITS } from "./weight";

/** Ten-billionths of a kilogram, written out a second time so that the table of weight.ts is held against something. */
const TEN_BILLIONTHS_OF_KG: Record<string, bigint> = {
  lb: 4_535_923_700n,
  kg: 10_000_000_000n,
  cwt: 453_592_370_000n,
  "short-ton": 9_071_847_400_000n,
  "long-ton": 10_160_469_088_000n,
  tonne: 10_000_000_000_000n,
  ozt: 311_034_768n,
};

const written = (count: bigint, places: number) => {
  const digits = String(count).padStart(places + 1, "0");
  return `${digits.slice(0, -places)}.${digits.slice(-places)}`;
};

describe("line amounts", () => {
  it("equal the exact ratio of whole numbers, rounded once", () => {
    const weights = WEIGHT_UNITS.filter((unit) => unit in TEN_BILLIONTHS_OF_KG);
    const prices = PRICE_UNITS.filter((unit) => unit !== "each");
    fc.assert(
      fc.property(
        fc.bigInt({ min: 0n, max: 10n ** 10n }),
        fc.bigInt({ min: 0n, max: 10n ** 10n }),
        fc.constantFrom(...weights),
        fc.constantFrom(...prices),
        fc.nat(3),
        (quantity, price, unit, per, exponent) => {
          const above = quantity * price * (TEN_BILLIONTHS_OF_KG[unit] ?? 0n) * 10n ** BigInt(exponent);
          const below = 10n ** 10n * (TEN_BILLIONTHS_OF_KG[per] ?? 0n);
          const expected = (above * 2n + below) / (below * 2n);
          fc.pre(expected <= BigInt(Number.MAX_SAFE_INTEGER));
          expect(lineAmount({ quantity: written(quantity, 4), unit, price: written(price, 6), per, exponent })).toBe(Number(expected));
        },
      ),
      { numRuns: 500 },
    );
  });

  it("are the mirror of themselves for a negative quantity", () => {
    expect(lineAmount({ quantity: "-1", unit: "lb", price: "0.005", per: "lb", exponent: 2 })).toBe(-1);
    expect(lineAmount({ quantity: "1", unit: "lb", price: "0.005", per: "lb", exponent: 2 })).toBe(1);
  });

  it("are not rounded on the way from kilograms to pounds", () => {
    // 10 kg are 22.0462262... lb: at 1,000 a pound the digits that a weight would drop are worth cents.
    expect(lineAmount({ quantity: "10", unit: "kg", price: "1000", per: "lb", exponent: 2 })).toBe(2_204_623);
  });

  it("count pieces when the price is for each, whatever they weigh", () => {
    expect(lineAmount({ quantity: "31.5", unit: "lb", price: "12.50", per: "each", exponent: 2, pieces: 3 })).toBe(3750);
  });

  it("are refused when the price is for each and nobody counted", () => {
    expect(() => lineAmount({ quantity: "31.5", unit: "lb", price: "12.50", per: "each", exponent: 2 })).toThrow(RangeError);
    expect(() => lineAmount({ quantity: "31.5", unit: "lb", price: "12.50", per: "each", exponent: 2, pieces: 1.5 })).toThrow(RangeError);
  });

  it("are refused when they no longer fit a whole number", () => {
    expect(() => lineAmount({ quantity: "9999999999", unit: "lb", price: "9999999", per: "lb", exponent: 2 })).toThrow(RangeError);
  });
});

describe("prices", () => {
  it("are normalised to the book unit at twelve decimals", () => {
    expect(normalisePrice("250", "short-ton", "lb")).toBe("0.125");
    expect(normalisePrice("1", "kg", "lb")).toBe("0.45359237");
    expect(normalisePrice("1", "lb", "kg")).toBe("2.204622621849");
    expect(normalisePrice("1", "lb", "kg")?.split(".")[1]).toHaveLength(NORMAL_PRICE_PLACES);
  });

  it("for each have no price by weight", () => {
    expect(normalisePrice("12", "each", "lb")).toBeNull();
    expect(comparePrices({ price: "12", per: "each" }, { price: "1", per: "lb" })).toBeNull();
    expect(comparePrices({ price: "12", per: "each" }, { price: "9", per: "each" })).toBe(1);
  });

  it("compare across units without rounding", () => {
    expect(comparePrices({ price: "2000", per: "short-ton" }, { price: "1", per: "lb" })).toBe(0);
    expect(comparePrices({ price: "2240", per: "long-ton" }, { price: "2000", per: "short-ton" })).toBe(0);
    expect(comparePrices({ price: "9000.000001", per: "tonne" }, { price: "4.08233133", per: "lb" })).toBe(1);
    expect(comparePrices({ price: "2.20", per: "kg" }, { price: "1", per: "lb" })).toBe(-1);
  });
});
