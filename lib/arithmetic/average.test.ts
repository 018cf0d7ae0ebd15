import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { drawCost, issue, receive, type StockState } from "./average";
import { compare, divide, isNegative, isZero, min } from "./decimal";

const EMPTY: StockState = { quantity: "0", costMinor: 0 };
const quantity = fc.integer({ min: 1, max: 5_000_000 }).map((count) => divide(String(count), "10000", 4));
const step = fc.oneof(
  fc.record({ act: fc.constant("receive" as const), quantity, costMinor: fc.nat(1_000_000) }),
  fc.record({ act: fc.constant("issue" as const), quantity }),
  fc.constant({ act: "empty" as const }),
);

describe("stock at moving average", () => {
  it("is never negative, and every cent received is either issued or still there", () => {
    fc.assert(
      fc.property(fc.array(step, { maxLength: 60 }), (steps) => {
        let [state, received, issued] = [EMPTY, 0, 0];
        for (const next of steps) {
          if (next.act === "receive") {
            state = receive(state, next.quantity, next.costMinor);
            received += next.costMinor;
          } else {
            const taken = issue(state, next.act === "empty" ? state.quantity : min(next.quantity, state.quantity));
            state = taken.state;
            issued += taken.costMinor;
          }
          expect(isNegative(state.quantity)).toBe(false);
          expect(state.costMinor).toBeGreaterThanOrEqual(0);
          expect(issued + state.costMinor).toBe(received);
          if (isZero(state.quantity)) expect(state.costMinor).toBe(0);
        }
      }),
    );
  });

  it("keeps its average through an issue, to the cent", () => {
    fc.assert(
      fc.property(quantity, quantity, fc.nat(10_000_000), (held, out, cost) => {
        fc.pre(compare(out, held) < 0);
        const { costMinor } = issue({ quantity: held, costMinor: cost }, out);
        const [q, all] = [BigInt(Math.round(10_000 * Number(out))), BigInt(Math.round(10_000 * Number(held)))];
        const off = (BigInt(costMinor) * all - BigInt(cost) * q) * 2n;
        expect(off <= all && off >= -all).toBe(true);
      }),
    );
  });

  it("refuses to issue more than is held", () => {
    expect(() => issue({ quantity: "10.0000", costMinor: 500 }, "10.0001")).toThrow(RangeError);
    expect(() => issue(EMPTY, "0.0001")).toThrow(RangeError);
  });

  it("refuses negative receipts and issues", () => {
    expect(() => receive(EMPTY, "-1", 5)).toThrow(RangeError);
    expect(() => receive(EMPTY, "1", -5)).toThrow(RangeError);
    expect(() => receive(EMPTY, "1", 0.5)).toThrow(RangeError);
    expect(() => issue({ quantity: "1", costMinor: 5 }, "-1")).toThrow(RangeError);
  });

  it("charges nothing for an issue of nothing", () => {
    expect(issue(EMPTY, "0")).toEqual({ state: EMPTY, costMinor: 0 });
  });
});

describe("drawing from a lot", () => {
  it("takes what is left with the last draw, or with one larger than the estimate", () => {
    expect(drawCost(1000, "5.0000", "5")).toBe(1000);
    expect(drawCost(1000, "7", "5")).toBe(1000);
    expect(drawCost(1000, "7", "0")).toBe(1000);
    expect(drawCost(1000, "0", "0")).toBe(0);
  });

  it("takes its share by weight, rounded half away from zero", () => {
    expect(drawCost(1000, "1", "3")).toBe(333);
    expect(drawCost(1, "1", "2")).toBe(1);
  });
});
