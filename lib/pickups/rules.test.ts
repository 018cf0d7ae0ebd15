import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isZero, sum } from "@/lib/arithmetic/decimal";
import { ROLES } from "@/db/words";
import { lineEstimate, pickupBooking, seesPaid, whyNotVoid, workOutBooking } from "./rules";

const total = (amounts: number[]) => amounts.reduce((a, b) => a + b, 0);

describe("a haul", () => {
  it("is estimated by count and typical weight, or as weighed", () => {
    expect(lineEstimate({ count: 3, typicalWeight: "36.0200" })).toBe("108.06");
    expect(lineEstimate({ count: 3, typicalWeight: "36.0200", weighed: "101.5000" })).toBe("101.5");
  });

  it("moves its estimate from outside onto the pile and its price into stock, from the account that paid", () => {
    const booked = pickupBooking({ pickupId: "p", estimates: ["108.06", "15.5"], paidMinor: 2500, paidFrom: "own-pocket", memberId: "m" });
    expect(booked.lines).toEqual([
      { place: "outside", quantity: "-123.56" },
      { place: "pile", pickupId: "p", quantity: "123.56" },
    ]);
    expect(booked.postings).toEqual([
      { account: "scrap-stock", amountMinor: 2500, pickupId: "p" },
      { account: "owed-to-members", amountMinor: -2500, pickupId: "p", memberId: "m" },
    ]);
  });
});

describe("working a haul out", () => {
  const output = (gradeId: string, net: string, price: string | null, held = net) => ({ gradeId, net, price, held });

  it("splits what is left of the cost by what the goods would bring", () => {
    const booked = workOutBooking({
      pickupId: "p",
      remainingWeight: "40",
      remainingCostMinor: 1000,
      outputs: [output("copper", "2", "4"), output("steel", "20", "0.1")],
    });
    // 2 lb at $4 against 20 lb at 10 cents is 8 to 2.
    expect(booked.postings).toEqual([
      { account: "scrap-stock", amountMinor: -1000, pickupId: "p" },
      { account: "scrap-stock", amountMinor: 800, gradeId: "copper", pickupId: "p" },
      { account: "scrap-stock", amountMinor: 200, gradeId: "steel", pickupId: "p" },
    ]);
    expect(booked.lines).toEqual([
      { place: "pile", pickupId: "p", quantity: "-40" },
      { place: "variance", quantity: "40" },
    ]);
  });

  it("charges the share of a grade that is all sold to what was sold, and everything to stock loss when there are no goods", () => {
    const sold = workOutBooking({ pickupId: "p", remainingWeight: "0", remainingCostMinor: 900, outputs: [output("copper", "2", "4", "0.0000")] });
    expect(sold.postings.at(-1)).toEqual({ account: "cost-of-scrap-sold", amountMinor: 900, gradeId: "copper", pickupId: "p" });
    const none = workOutBooking({ pickupId: "p", remainingWeight: "5", remainingCostMinor: 900, outputs: [] });
    expect(none.postings.at(-1)).toEqual({ account: "stock-loss", amountMinor: 900, pickupId: "p" });
  });

  it("loses and makes no cent and no pound, whatever is left and made", () => {
    const made = fc.record({
      gradeId: fc.uuid(),
      net: fc.integer({ min: 1, max: 99_999 }).map((n) => `${n}.5`),
      price: fc.option(fc.integer({ min: 0, max: 900 }).map((n) => `0.${n}`)),
      held: fc.constantFrom("0", "1.25"),
    });
    fc.assert(
      fc.property(fc.nat(10_000_000), fc.nat(100_000), fc.array(made, { maxLength: 12 }), (cost, weight, outputs) => {
        const booked = workOutBooking({ pickupId: "p", remainingWeight: String(weight), remainingCostMinor: cost, outputs });
        expect(total(booked.postings.map((posting) => posting.amountMinor))).toBe(0);
        expect(isZero(sum(booked.lines.map((line) => line.quantity)))).toBe(true);
        expect(booked.postings.slice(1).every((posting) => posting.amountMinor >= 0)).toBe(true);
      }),
    );
  });
});

describe("who sees and who may take back", () => {
  it("shows what was paid to the office and to the collector who paid it, unless money is hidden", () => {
    const sees = (hidesMoney: boolean) =>
      ROLES.map((role) => [role, seesPaid({ id: "me", role }, { hidesMoney }, "me"), seesPaid({ id: "me", role }, { hidesMoney }, "other")]);
    expect(sees(false)).toEqual([
      ["owner", true, true],
      ["bookkeeper", true, true],
      ["collector", true, false],
      ["sorter", false, false],
    ]);
    expect(sees(true).filter(([, own]) => own)).toEqual([
      ["owner", true, true],
      ["bookkeeper", true, true],
    ]);
  });

  it("lets a collector void only hauls of their own that are not worked out", () => {
    expect(whyNotVoid({ id: "me", role: "collector" }, { madeBy: "me", state: "open" })).toBeNull();
    expect(whyNotVoid({ id: "me", role: "collector" }, { madeBy: "other", state: "open" })).toContain("Ask the owner");
    expect(whyNotVoid({ id: "me", role: "collector" }, { madeBy: "me", state: "worked-out" })).toContain("Ask the owner");
    expect(whyNotVoid({ id: "me", role: "owner" }, { madeBy: "other", state: "worked-out" })).toBeNull();
  });
});
