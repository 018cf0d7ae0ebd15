import { describe, expect, test } from "vitest";
import { addMinor } from "@/lib/arithmetic/money";
import { averagePriceOf, costPostings, earningsOf, netEffects, readAmount, type AccountMonth, type MonthFigures } from "./rules";

const account = (code: string, kind: "income" | "expense", amountMinor: number): AccountMonth => ({ account: code, name: code, kind, amountMinor });

const figures = (month: string, accounts: AccountMonth[], grades: [string, string, number, number][]): MonthFigures => ({
  month,
  accounts,
  grades: new Map(grades.map(([gradeId, quantity, salesMinor, costMinor]) => [gradeId, { quantity, salesMinor, costMinor }])),
});

const review = (now: MonthFigures, before: MonthFigures) =>
  earningsOf({ now, before, names: new Map([["a", { name: "Shred", family: "steel" }]]), exponent: 2, pickups: 3, closedAt: null });

const NOW = figures(
  "2026-03",
  [
    account("scrap-sales", "income", -10_000),
    account("haul-away-fees", "income", -500),
    account("cost-of-scrap-sold", "expense", 1500),
    account("fuel", "expense", 700),
    account("yard-fees", "expense", 100),
    account("repairs", "expense", 0),
    account("stock-loss", "expense", 60),
    account("rounding", "expense", -3),
  ],
  [["a", "40", 10_000, 1500]],
);
const BEFORE = figures("2026-02", [account("scrap-sales", "income", -8000), account("fuel", "expense", 900)], [["a", "40", 8000, 0]]);

describe("the month's review", () => {
  test("leaves nothing out of the net: its parts sum to it", () => {
    const earnings = review(NOW, BEFORE);
    const { salesMinor, haulAwayFeesMinor, costOfScrapMinor, costsMinor, stockLossMinor, roundingMinor, netMinor } = earnings;
    expect(addMinor(salesMinor, haulAwayFeesMinor, -costOfScrapMinor, -costsMinor, -stockLossMinor, -roundingMinor)).toBe(netMinor);
    expect(netMinor).toBe(8143);
    expect(earnings.costsByKind.map((cost) => cost.account)).toEqual(["fuel", "yard-fees"]);
    expect(earnings.before).toEqual({ month: "2026-02", netMinor: 7100, salesMinor: 8000, quantity: "40", costOfScrapMinor: 0, costsMinor: 900 });
  });

  test("has effects that sum to the change of the net", () => {
    const earnings = review(NOW, BEFORE);
    const { changeMinor, scrapMinor, runningMinor, otherMinor } = netEffects(earnings);
    expect([changeMinor, scrapMinor, runningMinor, otherMinor]).toEqual([1043, -1500, 100, 443]);
    expect(addMinor(earnings.why.changeMinor, scrapMinor, runningMinor, otherMinor)).toBe(changeMinor);
  });

  test("drops a grade whose sales were all taken back, and knows one that was not sold before", () => {
    const taken = figures("2026-03", [], [["a", "0", 0, 0]]);
    expect(review(taken, BEFORE).byGrade).toEqual([]);
    expect(review(NOW, figures("2026-02", [], [["a", "0", 0, 0]])).byGrade[0]?.before).toBeNull();
  });

  test("has no average price where no weight was sold", () => {
    expect(averagePriceOf({ quantity: "0", salesMinor: 100 }, 2)).toBeNull();
    expect(averagePriceOf({ quantity: "3", salesMinor: 100 }, 2)).toBe("0.333333");
    expect(averagePriceOf({ quantity: "3", salesMinor: 100 }, 0)).toBe("33.333333");
  });
});

test("a cost is booked on its kind's account, and own-pocket money is owed to the member", () => {
  expect(costPostings({ kind: "fuel", amountMinor: 5, paidFrom: "card" }, "m")).toEqual([
    { account: "fuel", amountMinor: 5 },
    { account: "card", amountMinor: -5 },
  ]);
  expect(costPostings({ kind: "other", amountMinor: 5, paidFrom: "own-pocket" }, "m")[1]).toEqual({
    account: "owed-to-members",
    amountMinor: -5,
    memberId: "m",
  });
});

test.each([
  ["12.50", 1250],
  ["$1,234.5", 123_450],
  ["0", 0],
  ["12.345", null],
  ["-5", null],
  ["", null],
  ["9".repeat(30), null],
  ["twelve", null],
])("an amount typed as %j is %j", (text, minor) => {
  expect(readAmount(text, { exponent: 2, currencySymbols: ["$"] })).toBe(minor);
});
