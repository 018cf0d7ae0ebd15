import { describe, expect, it } from "vitest";
import * as format from "./format";

describe("numbers on a screen", () => {
  it("weights have one decimal in ledgers, more where asked, and groups of three", () => {
    expect(format.formatWeight("1284.6000")).toBe("1,284.6");
    expect(format.formatWeight("12.4", { places: 2 })).toBe("12.40");
    expect(format.formatWeight("0.05")).toBe("0.1");
    expect(format.formatWeightUnit("1284.6000", "lb")).toBe("1,284.6 lb");
    expect(format.formatWeightUnit("2", "short-ton", { places: 0 })).toBe("2 short ton");
  });

  it("weights not taken yet are a dash, and a zero difference is 0.0 without a sign", () => {
    expect(format.formatWeight(null)).toBe("–");
    expect(format.formatWeightUnit(null, "lb")).toBe("–");
    expect(format.formatWeight("0", { sign: true })).toBe("0.0");
    expect(format.formatWeight("-0.04", { sign: true })).toBe("0.0");
    expect(format.formatWeight("-0.04")).toBe("0.0");
    expect(format.formatWeight("-4.2")).toBe("−4.2");
    expect(format.formatWeight("4.2", { sign: true })).toBe("+4.2");
  });

  it("weights keep every digit that a binary float would lose", () => {
    expect(format.formatWeight("9007199254740993.0001", { places: 4 })).toBe("9,007,199,254,740,993.0001");
    expect(format.formatWeight("1.005", { places: 2 })).toBe("1.01");
  });

  it("money has the currency's decimals, a true minus, and a plus on changes only", () => {
    expect(format.formatMoney(230_995, "USD")).toBe("$2,309.95");
    expect(format.formatMoney(-180, "USD")).toBe("−$1.80");
    expect(format.formatMoney(49_367, "USD", { sign: true })).toBe("+$493.67");
    expect(format.formatMoney(0, "USD", { sign: true })).toBe("$0.00");
    expect(format.formatMoney(1234, "CAD")).toBe("$12.34");
    expect(format.formatMoney(1234, "JPY")).toBe("¥1,234");
    expect(format.formatMoney(Number.MAX_SAFE_INTEGER, "USD")).toBe("$90,071,992,547,409.91");
  });

  it("money is whole in the line, rounded half away from zero", () => {
    expect(format.formatMoney(230_995, "USD", { whole: true })).toBe("$2,310");
    expect(format.formatMoney(41_250, "USD", { whole: true })).toBe("$413");
    expect(format.formatMoney(-250, "USD", { whole: true })).toBe("−$3");
    expect(format.formatMoney(-40, "USD", { whole: true })).toBe("$0");
  });

  it("money in a table has no sign of its currency", () => {
    expect(format.formatMoneyPlain(193_508, "USD")).toBe("1,935.08");
    expect(format.formatMoneyPlain(-41_280, "USD")).toBe("−412.80");
    expect(format.formatMoneyPlain(1500, "KWD")).toBe("1.500");
  });

  it("prices have two decimals, three where the third says something or the price is small", () => {
    expect(["4.020000", "0.085", "0.05", "2.305", "3.2004", "0", "-0.02", "1234.5"].map((price) => format.formatPrice(price))).toEqual([
      "4.02",
      "0.085",
      "0.050",
      "2.305",
      "3.20",
      "0.00",
      "−0.020",
      "1,234.50",
    ]);
  });

  it("shares are percents", () => {
    expect(format.formatPercent("0.893")).toBe("89.3%");
    expect(format.formatPercent("-0.0625", { places: 2 })).toBe("−6.25%");
    expect(format.formatPercent("1", { places: 0 })).toBe("100%");
  });
});

describe("dates on a screen", () => {
  it("carry the year only when it is not this one", () => {
    expect(format.formatDate("2026-11-29", { today: "2026-12-31" })).toBe("Sun Nov 29");
    expect(format.formatDate("2025-11-29", { today: "2026-01-02" })).toBe("Sat Nov 29, 2025");
    expect(format.formatShortDate("2026-11-29")).toBe("Nov 29");
    expect(format.formatShortDate("2025-11-29", { today: "2026-01-02" })).toBe("Nov 29, 2025");
  });

  it("are the day they name, wherever the server stands", () => {
    expect(format.formatShortDate("2026-01-01")).toBe("Jan 1");
    expect(format.formatMonth("2026-11")).toBe("November 2026");
  });

  it("times are the outfit's, by the 24-hour clock", () => {
    expect(format.formatTime("2026-11-29T12:42:00Z", "America/New_York")).toBe("7:42");
    expect(format.formatTime(new Date("2026-07-01T18:05:00Z"), "America/New_York")).toBe("14:05");
    expect(format.formatTime("2026-11-29T05:03:00Z", "America/New_York")).toBe("0:03");
  });

  it("ages are in days", () => {
    expect(format.formatAge(9)).toBe("9 d");
  });
});
