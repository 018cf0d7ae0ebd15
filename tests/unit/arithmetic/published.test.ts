import { describe, expect, it } from "vitest";
import { jointCost } from "@/lib/arithmetic/allocate";
import { issue, receive } from "@/lib/arithmetic/average";
import { divide, multiply, roundTo } from "@/lib/arithmetic/decimal";
import { roundCash } from "@/lib/arithmetic/money";
import { lineAmount, normalisePrice } from "@/lib/arithmetic/price";
import { scaleTolerance } from "@/lib/arithmetic/tolerance";
import { convertWeight, netWeight, type WeightUnit } from "@/lib/arithmetic/weight";

// Each check names where its figures were published. "Computed" figures follow from published ones by exact arithmetic.

describe("weights agree with NIST Handbook 44, Appendix C (exact definitions)", () => {
  it.each<[string, WeightUnit, WeightUnit, string]>([
    ["10000", "lb", "kg", "4535.9237"],
    ["16", "oz", "lb", "1"],
    ["7000", "oz", "lb", "437.5"],
    ["1", "short-ton", "lb", "2000"],
    ["1", "long-ton", "lb", "2240"],
    ["1", "cwt", "lb", "100"],
    ["1", "cwt", "kg", "45.3592"],
    ["1", "short-ton", "kg", "907.1847"],
    ["1", "long-ton", "kg", "1016.0469"],
    ["1", "tonne", "lb", "2204.6226"],
    ["1", "ozt", "g", "31.1035"],
    ["10000", "ozt", "g", "311034.768"],
    ["10000", "oz", "g", "283495.2313"],
    ["1", "tonne", "ozt", "32150.7466"],
    ["10000", "tonne", "short-ton", "11023.1131"],
    ["10000", "tonne", "long-ton", "9842.0653"],
  ])("%s %s is, in %s, %s", (value, from, to, expected) => {
    expect(convertWeight(value, from, to)).toBe(expected);
  });
});

describe("weights agree with NIST SP 811, Appendix B.8 (factors of seven digits)", () => {
  it.each<[WeightUnit, string]>([
    ["lb", "0.4535924"],
    ["cwt", "45.35924"],
    ["short-ton", "907.1847"],
    ["long-ton", "1016.047"],
  ])("1 %s is %s kg", (unit, factor) => {
    // A million of the unit carries enough digits past the factor's last to be compared after rounding.
    const places = factor.split(".")[1]?.length ?? 0;
    expect(roundTo(divide(convertWeight("1000000", unit, "kg"), "1000000", 10), places)).toBe(factor);
  });
});

describe("prices agree with figures computed from NIST Handbook 44, Appendix C", () => {
  it("$4.00 a pound is $8.8184904874 a kilogram", () => {
    expect(normalisePrice("4.00", "lb", "kg")).toBe("8.818490487395");
  });

  it("$9,000 a tonne is $4.08233133 a pound, exactly", () => {
    expect(normalisePrice("9000", "tonne", "lb")).toBe("4.08233133");
  });

  it("$250 a long ton is $223.2142857 a short ton and $246.0516319 a tonne", () => {
    expect(roundTo(multiply(normalisePrice("250", "long-ton", "lb") ?? "", "2000", 12), 7)).toBe("223.2142857");
    expect(roundTo(multiply(normalisePrice("250", "long-ton", "kg") ?? "", "1000", 12), 7)).toBe("246.0516319");
  });
});

describe("tickets agree with published rules", () => {
  it("45,010 less 20,000 is 25,010, so a ticket that prints 25,000 is wrong (Measurement Canada, laboratory manual part 2, section 8.0)", () => {
    expect(netWeight({ gross: "45006", tare: "20004" })).toBe("25002");
    expect(netWeight({ gross: "45010", tare: "20000" })).toBe("25010");
  });

  it("money is the price times the weight to the nearest cent (NIST Handbook 44, G-S.5.5, from memory)", () => {
    expect(lineAmount({ quantity: "12.4", unit: "lb", price: "4.02", per: "lb", exponent: 2 })).toBe(4985);
    expect(lineAmount({ quantity: "2240", unit: "lb", price: "250", per: "long-ton", exponent: 2 })).toBe(25_000);
  });
});

describe("tolerances agree with NIST Handbook 44, 2.20, Table 6 (classes II, IIII and III L from memory)", () => {
  it.each([
    ["III", "0.5", "400", "1.0000"],
    ["III", "0.05", "150", "0.1500"],
    ["III L", "20", "12000", "40.0000"],
    ["III L", "20", "30000", "60.0000"],
    ["III L", "20", "10000", "20.0000"],
    ["III L", "20", "30020", "80.0000"],
    ["III L", "20", "0", "20.0000"],
    ["IIII", "1", "250", "3.0000"],
    ["IIII", "1", "50", "1.0000"],
    ["IIII", "1", "401", "5.0000"],
    ["II", "0.01", "50", "0.0100"],
    ["II", "0.01", "200", "0.0200"],
    ["II", "0.01", "200.01", "0.0300"],
  ] as const)("class %s, division %s, load %s: %s", (scaleClass, division, load, expected) => {
    expect(scaleTolerance({ load, division, scaleClass })).toBe(expected);
  });
});

describe("stock agrees with OpenStax, Principles of Accounting volume 1, chapter 10.3 (perpetual weighted average)", () => {
  // Opening 150 at $21; sell 120; buy 225 at $27; sell 180; buy 210 at $33. The book rounds the average to cents on the way.
  const opening = receive({ quantity: "0", costMinor: 0 }, "150", 315_000);
  const first = issue(opening, "120");
  const second = issue(receive(first.state, "225", 607_500), "180");
  const closing = receive(second.state, "210", 693_000);

  it("the first sale costs $2,520 and the second $4,732.94, where the book prints $4,732 and $4,733", () => {
    expect([first.costMinor, second.costMinor]).toEqual([252_000, 473_294]);
  });

  it("closing stock is 285 at $8,902.06, and with the cost of sales makes the $16,155 available", () => {
    expect(closing).toEqual({ quantity: "285", costMinor: 890_206 });
    expect(first.costMinor + second.costMinor + closing.costMinor).toBe(1_615_500);
  });
});

describe("joint cost agrees with textbook examples", () => {
  const priced = (...outputs: [net: string, price: string][]) => outputs.map(([net, price]) => ({ net, price }));
  const unpriced = (...nets: string[]) => nets.map((net) => ({ net, price: null }));

  it("lumber grades, a textbook problem with printed answers: 270,000, 405,000, 157,500 and 67,500 of 900,000", () => {
    const grades = priced(["1500000", "300"], ["3000000", "225"], ["1875000", "140"], ["1125000", "100"]);
    expect(jointCost(90_000_000, grades)).toEqual([27_000_000, 40_500_000, 15_750_000, 6_750_000]);
    expect(jointCost(90_000_000, unpriced("1500000", "3000000", "1875000", "1125000"))).toEqual([18_000_000, 36_000_000, 22_500_000, 13_500_000]);
  });

  it("Horngren, Cost Accounting, Pacific Lumber: 172,800, 144,000 and 43,200 of 360,000", () => {
    expect(jointCost(36_000_000, priced(["30", "9.60"], ["50", "4.80"], ["20", "3.60"]))).toEqual([17_280_000, 14_400_000, 4_320_000]);
    expect(jointCost(36_000_000, unpriced("30", "50", "20"))).toEqual([10_800_000, 18_000_000, 7_200_000]);
  });

  it("OpenStax, Principles of Accounting volume 2, 10.5, Calcion: 10,285.71 and 25,714.29 of 36,000", () => {
    expect(jointCost(3_600_000, priced(["25", "150"], ["75", "125"]))).toEqual([1_028_571, 2_571_429]);
    expect(jointCost(3_600_000, unpriced("25", "75"))).toEqual([900_000, 2_700_000]);
  });

  it("OpenStax, the same section, Strawberry Sweet: 26,967.74 and 13,032.26 of 40,000", () => {
    expect(jointCost(4_000_000, priced(["1", "104500"], ["1", "50500"]))).toEqual([2_696_774, 1_303_226]);
    expect(jointCost(4_000_000, unpriced("42000", "4000"))).toEqual([3_652_174, 347_826]);
  });

  it("OpenStax, the same section, Laramie: 23,826.71 and 42,173.29 of 66,000", () => {
    expect(jointCost(6_600_000, priced(["44", "250"], ["66", "295"]))).toEqual([2_382_671, 4_217_329]);
    expect(jointCost(6_600_000, unpriced("44", "66"))).toEqual([2_640_000, 3_960_000]);
  });
});

describe("rounding agrees with published rules", () => {
  it.each([
    [598, 600],
    [597, 595],
    [101, 100],
    [102, 100],
    [103, 105],
    [104, 105],
    [106, 105],
    [107, 105],
    [108, 110],
    [109, 110],
    [100, 100],
    [105, 105],
    [20_227, 20_225],
  ])(
    "cash without a one-cent coin: %i is paid as %i (Canada Revenue Agency, phasing out the penny; Office de la protection du consommateur)",
    (total, paid) => {
      expect(roundCash(total)).toBe(paid);
    },
  );

  it.each([
    ["2.345", 2, "2.35"],
    ["2.355", 2, "2.36"],
    ["0.125", 2, "0.13"],
    ["0.375", 2, "0.38"],
    ["2.5", 0, "3"],
    ["3.5", 0, "4"],
    ["-2.5", 0, "-3"],
    ["1.005", 2, "1.01"],
    ["2.675", 2, "2.68"],
  ] as const)("%s to %i decimals is %s: half away from zero, where binary floats and half-even differ (computed)", (value, places, expected) => {
    expect(roundTo(value, places)).toBe(expected);
  });

  it("12.251 to 0.1 is 12.3 at once (ISO 80000-1, Annex B, from memory: never round in stages)", () => {
    expect(roundTo("12.251", 1)).toBe("12.3");
  });

  it("a line's amount is rounded at once as well: 12.251 to 0.1 is 12.3", () => {
    expect(lineAmount({ quantity: "1", unit: "lb", price: "12.251", per: "lb", exponent: 1 })).toBe(123);
  });
});
