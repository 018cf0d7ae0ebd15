import { describe, expect, test } from "vitest";
import { atSellPoint, staleSheets, standingOf } from "./rules";

const TERMS = { weightUnit: "lb", exponent: 2 } as const;

describe("what stands in the shop", () => {
  test("is rounded once a grade; families and the total are sums of those", () => {
    const standing = standingOf(
      [
        { gradeId: "a", family: "copper", quantity: "10.005" },
        { gradeId: "b", family: "copper", quantity: "1.005" },
        { gradeId: "c", family: "steel", quantity: "3" },
      ],
      new Map([
        ["a", { price: "1", per: "lb" as const }],
        ["b", { price: "1", per: "lb" as const }],
        ["c", { price: "100", per: "short-ton" as const }],
      ]),
      TERMS,
    );
    // 10.01 + 1.01, where the sum rounded once would be 11.01.
    expect(standing).toEqual({
      families: [
        { family: "copper", quantity: "11.01", valueMinor: 1102 },
        { family: "steel", quantity: "3", valueMinor: 15 },
      ],
      quantity: "14.01",
      valueMinor: 1117,
      unpriced: 0,
    });
  });

  test("counts grades without a price as worth nothing and says how many; empty bins are left out", () => {
    const standing = standingOf(
      [
        { gradeId: "a", family: "copper", quantity: "2" },
        { gradeId: "b", family: "brass", quantity: "0" },
      ],
      new Map(),
      TERMS,
    );
    expect(standing).toEqual({ families: [{ family: "copper", quantity: "2", valueMinor: 0 }], quantity: "2", valueMinor: 0, unpriced: 1 });
    expect(standingOf([], new Map(), TERMS)).toEqual({ families: [], quantity: "0", valueMinor: 0, unpriced: 0 });
  });
});

test("a bin is at its sell point when it holds as much, and never at a point of zero", () => {
  expect(atSellPoint({ quantity: "149.9999", sellPoint: "150" })).toBe(false);
  expect(atSellPoint({ quantity: "150.0000", sellPoint: "150" })).toBe(true);
  expect(atSellPoint({ quantity: "5", sellPoint: "0" })).toBe(false);
});

test("stale sheets are those from before the limit, the oldest first, with the best prices that lean on them", () => {
  const price = (gradeId: string, sheetId: string, inForceFrom: string) => ({ gradeId, yardId: `yard ${sheetId}`, yardName: sheetId, sheetId, inForceFrom });
  const prices = [price("a", "fresh", "2026-03-05"), price("a", "old", "2026-03-04"), price("b", "old", "2026-03-04"), price("c", "older", "2026-02-01")];
  const best = new Map([
    ["a", { sheetId: "fresh" }],
    ["b", { sheetId: "old" }],
    ["c", { sheetId: "other" }],
  ]);
  expect(staleSheets(prices, best, "2026-03-05").map(({ yardName, leaning }) => [yardName, leaning])).toEqual([
    ["older", 0],
    ["old", 1],
  ]);
});
