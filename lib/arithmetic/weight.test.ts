import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { compare, divide, max, negate, subtract } from "./decimal";
import { BOOK_UNITS, convertWeight, netWeight, WEIGHT_UNITS } from "./weight";

const tenThousandths = fc.bigInt({ min: 0n, max: 10n ** 11n }).map((count) => divide(String(count), "10000", 4));

describe("weights", () => {
  it("round half away from zero, once, to 0.0001", () => {
    expect(convertWeight("0.05", "g", "kg")).toBe("0.0001");
    expect(convertWeight("0.0499", "g", "kg")).toBe("0");
  });

  it("stay as they are in their own unit", () => {
    fc.assert(
      fc.property(tenThousandths, fc.constantFrom(...WEIGHT_UNITS), (value, unit) => {
        expect(convertWeight(value, unit, unit)).toBe(value);
      }),
    );
  });

  it("come back from kilograms to within the two roundings", () => {
    fc.assert(
      fc.property(tenThousandths, (pounds) => {
        const off = subtract(convertWeight(convertWeight(pounds, "lb", "kg"), "kg", "lb"), pounds);
        // Half of 0.0001 kg is 0.00011 lb, and writing that in pounds rounds once more.
        expect(compare(max(off, negate(off)), "0.0002")).toBeLessThanOrEqual(0);
      }),
    );
  });

  it("come back from pounds to kilograms unchanged, the pound being the finer unit", () => {
    fc.assert(
      fc.property(tenThousandths, (kilograms) => {
        expect(convertWeight(convertWeight(kilograms, "kg", "lb"), "lb", "kg")).toBe(kilograms);
      }),
    );
  });

  it("keep their order in another unit", () => {
    fc.assert(
      fc.property(tenThousandths, tenThousandths, fc.constantFrom(...WEIGHT_UNITS), fc.constantFrom(...BOOK_UNITS), (a, b, from, to) => {
        const order = compare(convertWeight(a, from, to), convertWeight(b, from, to));
        expect([0, compare(a, b)]).toContain(order);
      }),
    );
  });

  it("are net of tare and of a deduction, and below zero when the paper says so", () => {
    expect(netWeight({ gross: "14.25", tare: "1.85" })).toBe("12.4");
    expect(netWeight({ gross: "521.0", tare: "89.2", deduction: "4.0" })).toBe("427.8");
    expect(netWeight({ gross: "1", tare: "1.5" })).toBe("-0.5");
  });
});
