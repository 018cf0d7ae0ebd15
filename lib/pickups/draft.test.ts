import { describe, expect, it } from "vitest";
import { freshDraft, haulTotals, holdsWork, readDraft, readHaul } from "./draft";
import { pickupInputSchema } from "./schema";

const VAC = "018f2d5e-0000-7000-8000-000000000001";
const FRIDGE = "018f2d5e-0000-7000-8000-000000000002";
const kinds = [
  { id: VAC, typicalWeight: "15.5" },
  { id: FRIDGE, typicalWeight: "185" },
];
const dollars = { exponent: 2, currencySymbols: ["$", "USD"] };
const draft = { ...freshDraft("018f2d5e-0000-7000-8000-0000000000aa", "visit"), counts: { [FRIDGE]: 1, [VAC]: 2 } };

describe("a haul kept on the device", () => {
  it("comes back as it was kept, and what is no draft comes back as nothing", () => {
    expect(readDraft(JSON.stringify(draft))).toEqual(draft);
    for (const text of [null, "", "{", "[]", JSON.stringify({ ...draft, counts: { [VAC]: -1 } }), JSON.stringify({ ...draft, source: "street" })])
      expect(readDraft(text)).toBeNull();
  });

  it("holds work as soon as anything is counted or typed", () => {
    expect(holdsWork(freshDraft("a", "b"))).toBe(false);
    expect(holdsWork({ ...freshDraft("a", "b"), counts: { [VAC]: 0 }, place: "  " })).toBe(false);
    expect(holdsWork(draft)).toBe(true);
    expect(holdsWork({ ...freshDraft("a", "b"), note: "door is off" })).toBe(true);
  });

  it("adds up what is counted", () => {
    expect(haulTotals(draft.counts, kinds)).toEqual({ items: 3, weight: "216" });
    expect(haulTotals({}, kinds)).toEqual({ items: 0, weight: "0" });
  });

  it("is read into what the API takes, today unless a day was chosen", () => {
    const reading = readHaul({ ...draft, place: " Alder Row ", paid: "$12.50" }, kinds, "2026-03-05", dollars);
    if (!reading.ok) throw new Error("not read");
    expect(pickupInputSchema.parse(reading.input)).toEqual({
      id: draft.id,
      pickedUpOn: "2026-03-05",
      source: "curb",
      place: "Alder Row",
      items: [
        { itemKindId: VAC, count: 2 },
        { itemKindId: FRIDGE, count: 1 },
      ],
      paidMinor: 1250,
      paidFrom: "cash",
      note: undefined,
    });
    const earlier = readHaul({ ...draft, pickedUpOn: "2026-03-01" }, kinds, "2026-03-05", dollars);
    expect(earlier.ok && earlier.input.pickedUpOn).toBe("2026-03-01");
    expect(earlier.ok && earlier.input.paidMinor).toBe(0);
  });

  it("asks only for items when nothing was done yet", () => {
    const reading = readHaul(freshDraft("", ""), kinds, "2026-03-05", dollars);
    const parsed = pickupInputSchema.safeParse(reading.ok ? reading.input : null);
    expect(parsed.error?.issues.map((issue) => issue.message)).toEqual(["Count one item or more."]);
  });

  it("says what is wrong with an amount that cannot be read", () => {
    for (const paid of ["twelve", "-5", "12.505", "1,23,4", "5 lb"]) {
      expect(readHaul({ ...draft, paid }, kinds, "2026-03-05", dollars)).toEqual({
        ok: false,
        errors: [{ path: "paidMinor", message: "Paid must be an amount, like 25 or 12.50." }],
      });
    }
  });
});
