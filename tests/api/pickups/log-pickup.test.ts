import { and, count, eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as onePickup from "@/app/api/o/[outfit]/pickups/[id]/route";
import { database } from "@/db/client";
import { auditLog, entries, movements, outfits, pickups as pickupTable, postings } from "@/db/schema";
import { addDays, dateIn } from "@/lib/clock";
import { newId } from "@/lib/ids";
import type { PickupRecord } from "@/lib/pickups/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks, lotOf } from "./books-of";

const DAY = "2026-01-15";

let outfit: TestOutfit;

beforeEach(async () => {
  outfit = await makeOutfit();
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

const haul = (more: Record<string, unknown> = {}) => ({
  pickedUpOn: DAY,
  source: "curb",
  place: "Alder Row, by no. 31",
  items: [
    { itemKindId: outfit.kind("upright-vacuum"), count: 2 },
    { itemKindId: outfit.kind("microwave-oven"), count: 3 },
  ],
  ...more,
});

const log = (body: unknown, role: "owner" | "bookkeeper" | "collector" | "sorter" = "collector", headers: Record<string, string> = {}) =>
  call<PickupRecord>(pickups.POST, outfit, { key: outfit.keys[role], body, headers });

const bookedRows = async () => {
  const db = database();
  const [made] = await db.select({ n: count() }).from(pickupTable).where(eq(pickupTable.outfitId, outfit.id));
  const [moved] = await db.select({ n: count() }).from(movements).where(eq(movements.outfitId, outfit.id));
  const [entered] = await db.select({ n: count() }).from(entries).where(eq(entries.outfitId, outfit.id));
  return [made?.n, moved?.n, entered?.n];
};

describe("logging a haul", () => {
  it("puts its estimate on the pile as a lot of its own, and books nothing in the money book when nothing was paid", async () => {
    const answer = await log(haul());
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    // 2 x 15.5 and 3 x 36.02.
    expect(answer.body).toMatchObject({
      number: 1,
      state: "open",
      itemCount: 5,
      estimatedWeight: "139.06",
      remainingWeight: "139.06",
      paidMinor: 0,
      version: 1,
    });
    expect(answer.body.items.map((item) => [item.name, item.count, item.estimatedWeight])).toEqual([
      ["Upright vacuum", 2, "31"],
      ["Microwave oven", 3, "108.06"],
    ]);
    expect(await booksOf(outfit.id)).toEqual({ accounts: {}, lots: [{ pickupId: answer.body.id, weight: "139.06", costMinor: 0 }], stock: {} });
  });

  it("takes a line's weight from the scale where one is given", async () => {
    const answer = await log(haul({ items: [{ itemKindId: outfit.kind("microwave-oven"), count: 3, weight: "101.5" }] }));
    expect(answer.body).toMatchObject({ estimatedWeight: "101.5", items: [{ weighed: "101.5", estimatedWeight: "101.5" }] });
  });

  it("keeps two lines of one kind as two lines and lists the kind once", async () => {
    const itemKindId = outfit.kind("box-fan");
    const answer = await log(
      haul({
        items: [
          { itemKindId, count: 2 },
          { itemKindId, count: 1, weight: "9.25" },
        ],
      }),
    );
    expect(answer.body.items.map((item) => item.estimatedWeight)).toEqual(["16", "9.25"]);
    expect(answer.body.kinds).toEqual([{ itemKindId, name: "Box fan", plural: "Box fans", count: 3 }]);
  });

  it.each([
    ["cash", "cash"],
    ["bank", "bank"],
    ["card", "card"],
    ["own-pocket", "owed-to-members"],
  ])("books what was paid from %s as the cost of the lot", async (paidFrom, account) => {
    const answer = await log(haul({ source: "bought", paidMinor: 2500, paidFrom }));
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    expect((await booksOf(outfit.id)).accounts).toEqual({ "scrap-stock": 2500, [account]: -2500 });
    expect(await lotOf(outfit.id, answer.body.id)).toEqual({ weight: "139.06", costMinor: 2500 });
  });

  it("owes own-pocket money to the member who paid", async () => {
    await log(haul({ paidMinor: 700, paidFrom: "own-pocket" }));
    const owed = await database()
      .select({ memberId: postings.memberId, amountMinor: postings.amountMinor })
      .from(postings)
      .where(and(eq(postings.outfitId, outfit.id), eq(postings.account, "owed-to-members")));
    expect(owed).toEqual([{ memberId: outfit.members.collector, amountMinor: -700 }]);
  });

  it("weighs in kilograms in an outfit of kilograms", async () => {
    outfit = await makeOutfit({ weightUnit: "kg", currency: "CAD", country: "CA" });
    const answer = await log(haul({ items: [{ itemKindId: outfit.kind("upright-vacuum"), count: 2 }] }));
    // 15.5 lb is 7.0307 kg.
    expect(answer.body.estimatedWeight).toBe("14.0614");
  });

  it("hands out running numbers without a gap, also to members at once", async () => {
    const answers = await Promise.all([1, 2, 3, 4].map((n) => log(haul(), n % 2 === 0 ? "owner" : "collector")));
    expect(answers.map((answer) => answer.body.number).toSorted()).toEqual([1, 2, 3, 4]);
  });

  it("says in the audit log who did it", async () => {
    const answer = await log(haul());
    const rows = await database().select().from(auditLog).where(eq(auditLog.outfitId, outfit.id));
    expect(rows.map((row) => [row.action, row.subjectId, row.memberId])).toEqual([["log-pickup", answer.body.id, outfit.members.collector]]);
  });
});

describe("the same haul sent again", () => {
  it("books once and gives the first answer again", async () => {
    const headers = { "idempotency-key": newId() };
    const body = haul({ paidMinor: 500 });
    const first = await log(body, "collector", headers);
    const again = await log(body, "collector", headers);
    expect([first.status, again.status]).toEqual([201, 201]);
    expect(again.body).toEqual(first.body);
    expect(again.headers.get("idempotency-replayed")).toBe("true");
    expect(await bookedRows()).toEqual([1, 1, 1]);
  });

  it("refuses another haul under the same key", async () => {
    const headers = { "idempotency-key": newId() };
    await log(haul(), "collector", headers);
    expect((await log(haul({ note: "another" }), "collector", headers)).status).toBe(422);
    expect(await bookedRows()).toEqual([1, 1, 0]);
  });

  it("takes an id chosen by the caller, and only once", async () => {
    const id = newId();
    expect((await log(haul({ id }))).body.id).toBe(id);
    expect((await log(haul({ id }))).status).toBe(409);
    expect(await bookedRows()).toEqual([1, 1, 0]);
  });
});

describe("what is refused, with the field named and nothing booked", () => {
  const today = () => dateIn("America/New_York", new Date());
  const vacuum = () => outfit.kind("upright-vacuum");
  const cases: [string, string, () => Record<string, unknown>][] = [
    ["no items", "items", () => ({ items: [] })],
    ["more than 100 lines", "items", () => ({ items: Array.from({ length: 101 }, () => ({ itemKindId: vacuum(), count: 1 })) })],
    ["a count of zero", "items.0.count", () => ({ items: [{ itemKindId: vacuum(), count: 0 }] })],
    ["a count below zero", "items.0.count", () => ({ items: [{ itemKindId: vacuum(), count: -2 }] })],
    ["half an item", "items.0.count", () => ({ items: [{ itemKindId: vacuum(), count: 1.5 }] })],
    ["more than 1000 of a kind", "items.0.count", () => ({ items: [{ itemKindId: vacuum(), count: 1001 }] })],
    ["a count in quotes", "items.0.count", () => ({ items: [{ itemKindId: vacuum(), count: "2" }] })],
    ["a weight of zero", "items.0.weight", () => ({ items: [{ itemKindId: vacuum(), count: 1, weight: "0" }] })],
    ["a weight with five decimals", "items.0.weight", () => ({ items: [{ itemKindId: vacuum(), count: 1, weight: "1.23456" }] })],
    ["a weight as a number", "items.0.weight", () => ({ items: [{ itemKindId: vacuum(), count: 1, weight: 3 }] })],
    ["NaN as a weight", "items.0.weight", () => ({ items: [{ itemKindId: vacuum(), count: 1, weight: "NaN" }] })],
    [
      "an item kind that nobody has",
      "items.1.itemKindId",
      () => ({
        items: [
          { itemKindId: vacuum(), count: 1 },
          { itemKindId: newId(), count: 1 },
        ],
      }),
    ],
    ["words for an item kind", "items.0.itemKindId", () => ({ items: [{ itemKindId: "fridge", count: 1 }] })],
    ["a field that is not there", "items.0.grade", () => ({ items: [{ itemKindId: vacuum(), count: 1, grade: "copper" }] })],
    ["a day that lies ahead", "pickedUpOn", () => ({ pickedUpOn: addDays(today(), 1) })],
    ["a day that is far off", "pickedUpOn", () => ({ pickedUpOn: "1999-12-31" })],
    ["a day that does not exist", "pickedUpOn", () => ({ pickedUpOn: "2026-02-30" })],
    ["a source that is not one", "source", () => ({ source: "street" })],
    ["money below zero", "paidMinor", () => ({ paidMinor: -1 })],
    ["half a cent", "paidMinor", () => ({ paidMinor: 10.5 })],
    ["more money than there is", "paidMinor", () => ({ paidMinor: 10_000_000_001 })],
    ["a purse that is not one", "paidFrom", () => ({ paidFrom: "wallet" })],
    ["a place of 201 letters", "place", () => ({ place: "x".repeat(201) })],
    ["a note of 2001 letters", "note", () => ({ note: "x".repeat(2001) })],
    ["a name for it", "name", () => ({ name: "my haul" })],
  ];

  it.each(cases)("%s", async (_name, path, change) => {
    const answer = await log(haul(change()));
    expect(answer.status, JSON.stringify(answer.body)).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toContain(path);
    expect(await bookedRows()).toEqual([0, 0, 0]);
  });

  it("another outfit's item kind, in the same words as one that nobody has", async () => {
    const other = await makeOutfit();
    const answer = await log(haul({ items: [{ itemKindId: other.kind("upright-vacuum"), count: 1 }] }));
    expect(answer.status).toBe(422);
    expect(answer.problem.errors).toEqual([{ path: "items.0.itemKindId", message: "There is no such item kind here." }]);
    expect(await bookedRows()).toEqual([0, 0, 0]);
  });

  it("takes today, and keeps words of any script as they were typed", async () => {
    const answer = await log(haul({ pickedUpOn: today(), place: "شارع الورد 🪙", note: "door is off\nتنبيه" }));
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    expect(answer.body).toMatchObject({ pickedUpOn: today(), place: "شارع الورد 🪙", note: "door is off\nتنبيه" });
  });
});

describe("who may log and see a haul", () => {
  it("lets the owner and collectors log, and nobody else", async () => {
    const statuses = [];
    for (const role of ["owner", "bookkeeper", "collector", "sorter"] as const) statuses.push((await log(haul(), role)).status);
    expect(statuses).toEqual([201, 403, 201, 403]);
  });

  it("shows what was paid to the office and the collector who paid, and hides it from the rest", async () => {
    const own = (await log(haul({ paidMinor: 900 }))).body.id;
    const others = (await log(haul({ paidMinor: 900 }), "owner")).body.id;
    const paid = async (id: string, role: "owner" | "bookkeeper" | "collector" | "sorter") =>
      (await call<PickupRecord>(onePickup.GET, outfit, { key: outfit.keys[role], params: { id } })).body.paidMinor;
    expect(await Promise.all((["owner", "bookkeeper", "collector", "sorter"] as const).map((role) => paid(own, role)))).toEqual([900, 900, 900, null]);
    expect(await paid(others, "collector")).toBeNull();
    await database().update(outfits).set({ hidesMoney: true }).where(eq(outfits.id, outfit.id));
    expect(await paid(own, "collector")).toBeNull();
    expect(await paid(own, "owner")).toBe(900);
  });

  it("does not exist for another outfit, nor does an id in any other form", async () => {
    const other = await makeOutfit();
    const { id } = (await log(haul())).body;
    for (const wanted of [id, newId(), "1", "🪙", "' or 1=1 --"]) {
      expect((await call(onePickup.GET, other, { key: other.keys.owner, params: { id: wanted } })).status).toBe(404);
    }
  });
});
