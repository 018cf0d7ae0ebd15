import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { divide } from "./decimal";
import { Fraction } from "./fraction";
import { whyItChanged } from "./why";

const sales = fc.dictionary(
  fc.constantFrom("a", "b", "c", "d", "e"),
  fc.record({ quantity: fc.nat(5_000_000).map((count) => divide(String(count), "10000", 4)), salesMinor: fc.integer({ min: -10_000, max: 1_000_000 }) }),
);

describe("why sales changed", () => {
  it("is explained to the cent: price, mix and volume sum to the change", () => {
    fc.assert(
      fc.property(sales, sales, (before, now) => {
        const why = whyItChanged(before, now);
        expect(why.priceMinor + why.mixMinor + why.volumeMinor).toBe(why.changeMinor);
      }),
    );
  });

  it("is nothing when nothing changed", () => {
    fc.assert(
      fc.property(sales, (month) => {
        const still = whyItChanged(month, month);
        expect(still.changeMinor).toBe(0);
        expect(still.volumeMinor + still.mixMinor + still.priceMinor).toBe(0);
      }),
    );
  });

  it("is all volume when nothing was sold before", () => {
    expect(whyItChanged({}, { a: { quantity: "5", salesMinor: 900 } })).toEqual({ priceMinor: 0, mixMinor: 0, volumeMinor: 900, changeMinor: 900 });
  });

  it("is all price when the same weight of one grade brought more", () => {
    const before = { a: { quantity: "5", salesMinor: 900 } };
    expect(whyItChanged(before, { a: { quantity: "5.0000", salesMinor: 1000 } })).toEqual({ priceMinor: 100, mixMinor: 0, volumeMinor: 0, changeMinor: 100 });
  });

  it("rounds a sum of endless quotients by its exact value", () => {
    // Before, a brought 1/3 and b 1/6 of a cent a pound; a pound of each now would have brought exactly half a cent, which rounds away from zero.
    const before = { a: { quantity: "3", salesMinor: 1 }, b: { quantity: "6", salesMinor: 1 } };
    const now = { a: { quantity: "1", salesMinor: 0 }, b: { quantity: "1", salesMinor: 0 } };
    expect(whyItChanged(before, now).priceMinor).toBe(-1);
  });
});

describe("fractions", () => {
  it("refuse a zero denominator", () => {
    expect(() => Fraction.of(1).over(Fraction.zero)).toThrow(RangeError);
  });

  it("divide by a negative without losing the sign", () => {
    expect(Fraction.from("1.5").over(Fraction.of(-1)).rounded()).toBe(-2);
    expect(Fraction.from("-1.5").over(Fraction.of(-1)).rounded()).toBe(2);
  });
});
