import { afterEach, beforeEach, describe, expect, it } from "vitest";
import * as earnings from "@/app/api/o/[outfit]/earnings/route";
import { addMinor } from "@/lib/arithmetic/money";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { expectTrueBooks } from "../pickups/books-of";
import { deskOf } from "./desk";

let outfit: TestOutfit;
let desk: ReturnType<typeof deskOf>;

beforeEach(async () => {
  outfit = await makeOutfit();
  desk = deskOf(outfit);
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

const copper = { grade: "no2-copper", price: "4", net: "10", amountMinor: 4000 };

describe("GET /earnings", () => {
  it("A-19: the month moves by exactly what was entered, and voids bring it back to what it was", async () => {
    const [binId, yardId] = [await desk.bin("no2-copper"), await desk.yard("Northgate Metals")];
    const pickupId = await desk.haul("2026-03-02", 5000);
    await desk.weigh(binId, "40", "2026-03-03", { pickupId });
    const before = await desk.month("2026-03");
    expect(before).toMatchObject({ salesMinor: 0, quantity: "0", netMinor: 0, byGrade: [], costsByKind: [], pickups: 1 });

    const ticket = await desk.sell(yardId, "2026-03-10", { ...copper, binId });
    const cost = await desk.cost("2026-03-31", 1234);
    const after = await desk.month("2026-03");
    // A quarter of the 2000 that 40 lb of the 100 lb haul cost.
    expect(after).toMatchObject({ salesMinor: 4000, quantity: "10", costOfScrapMinor: 500, costsMinor: 1234, netMinor: 4000 - 500 - 1234 });
    expect(after.costsByKind).toEqual([{ account: "fuel", name: "Fuel", amountMinor: 1234 }]);
    expect(after.byGrade).toEqual([
      {
        gradeId: outfit.grade("no2-copper"),
        gradeName: expect.any(String) as string,
        family: "copper",
        quantity: "10",
        salesMinor: 4000,
        costMinor: 500,
        marginMinor: 3500,
        averagePrice: "4",
        before: null,
      },
    ]);
    // Days just outside the month belong to others.
    expect(await desk.month("2026-02")).toMatchObject({ netMinor: 0, pickups: 0 });
    expect(await desk.month("2026-04")).toMatchObject({ netMinor: 0, before: { netMinor: after.netMinor, salesMinor: 4000, quantity: "10" } });

    await desk.voidTicket(ticket);
    await desk.voidCost(cost);
    expect(await desk.month("2026-03")).toEqual(before);
  });

  it("says why sales changed against the month before: price, volume and mix sum to the change", async () => {
    const [binId, brassBin, yardId] = [await desk.bin("no2-copper"), await desk.bin("yellow-brass"), await desk.yard("Northgate Metals")];
    await desk.weigh(binId, "40", "2026-02-01");
    await desk.weigh(brassBin, "40", "2026-02-01");
    await desk.sell(yardId, "2026-02-10", { ...copper, binId });
    await desk.sell(yardId, "2026-02-10", { grade: "yellow-brass", binId: brassBin, net: "10", price: "2", amountMinor: 2000 });
    await desk.sell(yardId, "2026-03-10", { ...copper, binId, price: "4.5", net: "20", amountMinor: 9000 });
    const { why, byGrade } = await desk.month("2026-03");
    // 20 lb at 50 cents more; at February's prices 80 against 60 at its average; 60 against 60 by weight.
    expect(why).toEqual({ priceMinor: 1000, mixMinor: 2000, volumeMinor: 0, changeMinor: 3000 });
    expect(addMinor(why.priceMinor, why.mixMinor, why.volumeMinor)).toBe(why.changeMinor);
    expect(byGrade.map((grade) => grade.before)).toEqual([{ quantity: "10", salesMinor: 4000, averagePrice: "4" }]);
  });

  it("is for the owner and the bookkeeper, of their own outfit", async () => {
    const other = await makeOutfit();
    for (const role of ["collector", "sorter"] as const) {
      expect((await call(earnings.GET, outfit, { key: outfit.keys[role], query: { month: "2026-03" } })).status).toBe(403);
    }
    expect((await call(earnings.GET, outfit, { key: other.keys.owner, query: { month: "2026-03" } })).status).toBe(404);
    expect((await call(earnings.GET, outfit, { query: { month: "2026-03" } })).status).toBe(401);
  });

  it.each(["", "2026-13", "2026-3", "03-2026", "1999-01", "2026-03-01", "🪙", "x".repeat(5000)])("refuses %j as a month and names it", async (month) => {
    const answer = await call(earnings.GET, outfit, { key: outfit.keys.owner, query: { month } });
    expect(answer.status).toBe(422);
    expect(answer.problem.errors?.map((error) => error.path)).toEqual(["month"]);
  });

  it("refuses a question it does not know", async () => {
    expect((await call(earnings.GET, outfit, { key: outfit.keys.owner, query: { month: "2026-03", by: "yard" } })).status).toBe(422);
  });
});
