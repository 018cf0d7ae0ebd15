import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { allocate, jointCost } from "./allocate";
import { divide } from "./decimal";

const total = fc.integer({ min: -1_000_000_000, max: 1_000_000_000 });
const weight = fc.integer({ min: 0, max: 10_000_000 }).map((count) => divide(String(count), "10000", 4));
const sumOf = (parts: number[]) => parts.reduce((sum, part) => sum + part, 0);

describe("splitting an amount", () => {
  it("gives parts that sum to the whole", () => {
    fc.assert(
      fc.property(total, fc.array(weight, { minLength: 1, maxLength: 40 }), (amount, weights) => {
        expect(sumOf(allocate(amount, weights))).toBe(amount);
      }),
    );
  });

  it("leaves no part a whole unit away from its exact share", () => {
    fc.assert(
      fc.property(total, fc.array(fc.integer({ min: 0, max: 1_000_000 }), { minLength: 1, maxLength: 20 }), (amount, weights) => {
        fc.pre(weights.some((each) => each > 0));
        const all = BigInt(sumOf(weights));
        allocate(amount, weights.map(String)).forEach((part, index) => {
          const off = BigInt(part) * all - BigInt(amount) * BigInt(weights[index] ?? 0);
          expect(off < all && off > -all).toBe(true);
        });
      }),
    );
  });

  it("gives nothing to a part of no weight, unless no part has any", () => {
    expect(allocate(100, ["0", "1", "0", "2"])).toEqual([0, 33, 0, 67]);
    expect(allocate(100, ["0", "0.000", "0"])).toEqual([34, 33, 33]);
  });

  it("gives ties to the earlier part", () => {
    expect(allocate(100, ["1", "1", "1"])).toEqual([34, 33, 33]);
    expect(allocate(2, ["1", "1", "1", "1"])).toEqual([1, 1, 0, 0]);
  });

  it("mirrors a negative amount, without negative zeros", () => {
    fc.assert(
      fc.property(total, fc.array(weight, { minLength: 1, maxLength: 12 }), (amount, weights) => {
        expect(allocate(0 - amount, weights)).toEqual(allocate(amount, weights).map((part) => 0 - part));
      }),
    );
    expect(allocate(-1, ["1", "1"])).toEqual([-1, 0]);
  });

  it("refuses negative weights, and an amount with nothing to carry it", () => {
    expect(() => allocate(5, ["1", "-1"])).toThrow(RangeError);
    expect(() => allocate(5, [])).toThrow(RangeError);
    expect(allocate(0, [])).toEqual([]);
  });
});

describe("joint cost", () => {
  const output = fc.record({ net: weight, price: fc.option(weight) });

  it("never loses or makes a cent", () => {
    fc.assert(
      fc.property(fc.nat(100_000_000), fc.array(output, { minLength: 1, maxLength: 15 }), (cost, outputs) => {
        const parts = jointCost(cost, outputs);
        expect(sumOf(parts)).toBe(cost);
        expect(parts.every((part) => part >= 0)).toBe(true);
      }),
    );
  });

  it("goes by weight when no output has a price", () => {
    expect(
      jointCost(1000, [
        { net: "3", price: null },
        { net: "1", price: null },
      ]),
    ).toEqual([750, 250]);
  });

  it("goes by weight when every price is zero", () => {
    expect(
      jointCost(1000, [
        { net: "3", price: "0" },
        { net: "1", price: null },
      ]),
    ).toEqual([750, 250]);
  });

  it("leaves an output without a price free while others have one", () => {
    expect(
      jointCost(1000, [
        { net: "3", price: null },
        { net: "1", price: "0.10" },
      ]),
    ).toEqual([0, 1000]);
  });
});
