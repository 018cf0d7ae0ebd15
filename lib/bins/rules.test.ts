import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isNegative, isZero, sum, compare, negate, divide } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import { countBooking, drawProblems, fitsTheBook, weighed, weighInBooking, type Lot } from "./rules";

const into = { binId: "bin", gradeId: "grade" };
/** Weights of up to four decimals, as the book has them. */
const weight = (least: number) => fc.integer({ min: least, max: 50_000_000 }).map((n) => divide(String(n), "10000", 4));
const lot = fc.record({ pickupId: fc.uuid(), remainingWeight: weight(0), remainingCostMinor: fc.integer({ min: 0, max: 1_000_000 }) });

describe("what the scale said", () => {
  it("is added up as typed and converted once", () => {
    // 1.0001 kg is 2.2048 lb; three of them are 6.6145 lb, not 6.6144.
    const draw = { gross: "1.0001", tare: "0" };
    expect(weighed([draw, draw, draw], "kg", "lb")).toEqual({ gross: "6.6145", tare: "0", net: "6.6145" });
  });

  it("is wrong at the draw that puts nothing in", () => {
    const draws = [
      { gross: "2", tare: "1" },
      { gross: "1", tare: "2" },
      { gross: "2", tare: "2.0" },
    ];
    expect(drawProblems(draws, true).map((problem) => problem.path)).toEqual(["draws.1.tare", "draws.2.gross"]);
    expect(drawProblems([{ gross: "1", tare: "2" }], false).map((problem) => problem.path)).toEqual(["tare"]);
    expect(drawProblems([{ gross: "2", tare: "1" }], false)).toEqual([]);
  });

  it("fits the book below ten million", () => {
    expect([fitsTheBook("9999999.9999"), fitsTheBook("10000000.0000")]).toEqual([true, false]);
  });
});

describe("a weigh-in in both books", () => {
  it("balances, never overdraws a lot, and leaves no cost on an empty one", () => {
    fc.assert(
      fc.property(weight(1), fc.option(fc.array(lot, { maxLength: 5 })), (net, lots) => {
        const { lines, postings } = weighInBooking({ ...into, net, lots });
        expect(isZero(sum(lines.map((line) => line.quantity)))).toBe(true);
        expect(addMinor(...postings.map((posting) => posting.amountMinor))).toBe(0);
        for (const one of lots ?? []) {
          const drawn = sum(lines.filter((line) => line.pickupId === one.pickupId).map((line) => negate(line.quantity)));
          const cost = addMinor(...postings.filter((posting) => posting.pickupId === one.pickupId).map((posting) => -posting.amountMinor));
          expect(compare(drawn, one.remainingWeight)).not.toBe(1);
          expect(cost >= 0 && cost <= one.remainingCostMinor).toBe(true);
          if (postings.some((posting) => posting.pickupId === one.pickupId) && compare(drawn, one.remainingWeight) === 0)
            expect(cost).toBe(one.remainingCostMinor);
        }
        expect(lines.some((line) => line.place === "bin" && line.quantity === net)).toBe(true);
      }),
    );
  });

  it("takes all that a used-up pickup still costs", () => {
    const lots: Lot[] = [{ pickupId: "p", remainingWeight: "0", remainingCostMinor: 43 }];
    expect(weighInBooking({ ...into, net: "1", lots }).postings).toEqual([
      { account: "scrap-stock", amountMinor: -43, pickupId: "p" },
      { account: "scrap-stock", amountMinor: 43, gradeId: "grade" },
    ]);
  });
});

describe("a count in both books", () => {
  it("balances, and a loss never costs more than there is", () => {
    fc.assert(
      fc.property(weight(1), fc.integer({ min: 0, max: 1_000_000 }), weight(1), fc.boolean(), (quantity, costMinor, change, gain) => {
        const less = compare(change, quantity) > 0 ? quantity : change;
        const difference = gain ? change : negate(less);
        const { lines, postings } = countBooking({ ...into, difference, stock: { quantity, costMinor } });
        expect(isZero(sum(lines.map((line) => line.quantity)))).toBe(true);
        expect(addMinor(...postings.map((posting) => posting.amountMinor))).toBe(0);
        const moved = postings[0]?.amountMinor ?? 0;
        if (isNegative(difference)) expect(moved <= 0 && -moved <= costMinor).toBe(true);
        else expect(moved).toBeGreaterThanOrEqual(0);
      }),
    );
  });

  it("rounds half a cent away from zero both ways, and finds metal of an empty grade at no cost", () => {
    const moved = (difference: string, stock: { quantity: string; costMinor: number }) => countBooking({ ...into, difference, stock }).postings[0]?.amountMinor;
    expect(moved("-1", { quantity: "2", costMinor: 5 })).toBe(-3);
    expect(moved("1", { quantity: "2", costMinor: 5 })).toBe(3);
    expect(moved("40", { quantity: "0", costMinor: 0 })).toBe(0);
  });
});
