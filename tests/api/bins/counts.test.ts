import { afterEach, beforeEach, describe, expect, it } from "vitest";
import average from "../../vectors/moving-average.json" with { type: "json" };
import { database } from "@/db/client";
import { getBin } from "@/lib/bins/queries";
import { subtract, trim } from "@/lib/arithmetic/decimal";
import { newId } from "@/lib/ids";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks } from "../pickups/books-of";
import { benchOf, DAY, expectFieldError, linesOf } from "./bench";

let outfit: TestOutfit;
let bench: ReturnType<typeof benchOf>;
let gradeId: string;
let binId: string;

// 100 lb of No. 2 copper that cost $30.01, in a bin that weighs 2 lb.
beforeEach(async () => {
  outfit = await makeOutfit();
  bench = benchOf(outfit);
  gradeId = outfit.grade("no2-copper");
  binId = await bench.bin("no2-copper", { label: "C2-1", tare: "2" });
  await bench.weigh(binId, "100", { pickupId: await bench.haul("100", 3001) });
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

describe("a count", () => {
  it("that finds less books the loss at the moving average", async () => {
    const counted = await bench.tryCount({ binId, gross: "98.5", note: "spring count" }, { role: "sorter" });
    expect(counted.status).toBe(201);
    expect(counted.body).toMatchObject({ binLabel: "C2-1", gradeId, gross: "98.5", tare: "2", net: "96.5", bookQuantity: "100", difference: "-3.5" });
    // 3001 x 3.5 / 100 = 105.035
    expect(await booksOf(outfit.id)).toMatchObject({
      accounts: { cash: -3001, "scrap-stock": 2896, "stock-loss": 105 },
      stock: { [gradeId]: { quantity: "96.5", costMinor: 2896 } },
    });
    expect(await linesOf(outfit.id, counted.body.id)).toEqual([`${DAY} bin -3.5`, `${DAY} variance 3.5`]);
    expect((await bench.seeBin(binId)).body.balance).toBe("96.5");
  });

  it("that finds more books the gain at the same average", async () => {
    const counted = await bench.count(binId, "101.5");
    expect(counted.difference).toBe("1.5");
    // 3001 x 1.5 / 100 = 45.015
    expect(await booksOf(outfit.id)).toMatchObject({
      accounts: { cash: -3001, "scrap-stock": 3046, "stock-loss": -45 },
      stock: { [gradeId]: { quantity: "101.5", costMinor: 3046 } },
    });
  });

  it("that finds metal where the grade had none books it at no cost", async () => {
    const shred = await bench.bin("shred");
    await bench.count(shred, "40");
    expect((await booksOf(outfit.id)).stock[outfit.grade("shred")]).toEqual({ quantity: "40", costMinor: 0 });
  });

  it("that finds nothing takes all that the grade cost", async () => {
    await bench.count(binId, "0");
    expect(await booksOf(outfit.id)).toMatchObject({ accounts: { cash: -3001, "stock-loss": 3001 }, stock: {} });
    expect((await bench.seeBin(binId)).body).toMatchObject({ balance: "0", heldSince: null });
  });

  it("that agrees with the book is kept and books nothing", async () => {
    const before = await booksOf(outfit.id);
    const counted = await bench.tryCount({ binId, gross: "102" });
    expect(counted.body).toMatchObject({ net: "100", difference: "0" });
    expect(await booksOf(outfit.id)).toEqual(before);
    expect(await linesOf(outfit.id, counted.body.id)).toEqual([]);
    expect((await bench.seeCounts()).body.items.map((count) => count.id)).toEqual([counted.body.id]);
    expect((await bench.voidCount(counted.body.id)).body.voidedAt).not.toBeNull();
  });

  it("leaves the grade's other bins as they are", async () => {
    const second = await bench.bin("no2-copper");
    await bench.weigh(second, "100");
    // The average over both bins is now 15.005 a pound.
    await bench.count(binId, "90");
    expect((await booksOf(outfit.id)).stock[gradeId]).toEqual({ quantity: "190", costMinor: 3001 - 150 });
    expect((await bench.seeBin(second)).body.balance).toBe("100");
  });

  it("sent again with its key is one count, and by two at once each counts what the other left", async () => {
    const headers = { "idempotency-key": newId() };
    const [first, second] = [await bench.count(binId, "90", {}, { headers }), await bench.count(binId, "90", {}, { headers })];
    expect(second).toEqual(first);
    const both = await Promise.all([bench.count(binId, "80"), bench.count(binId, "80")]);
    expect(both.map((count) => count.difference).sort()).toEqual(["-10", "0"]);
    expect((await bench.seeBin(binId)).body.balance).toBe("80");
  });
});

describe("the moving average through the API", () => {
  it.each(average.cases.slice(0, 3).map((one, index) => ({ steps: one.steps, index })))("is the published one, case $index", async ({ steps }) => {
    const grade = "shred";
    const id = await bench.bin(grade);
    for (const step of steps) {
      if (step.receive !== undefined) {
        await bench.weigh(id, step.receive, { pickupId: await bench.haul(step.receive, step.costMinor) });
      } else if (step.issue !== undefined) {
        const bin = await getBin(database(), { outfitId: outfit.id, id });
        await bench.count(id, subtract(bin?.balance ?? "0", step.issue));
      }
      const held = (await booksOf(outfit.id)).stock[outfit.grade(grade)] ?? { quantity: "0", costMinor: 0 };
      expect(held).toEqual({ quantity: trim(step.after.quantity), costMinor: step.after.costMinor });
    }
  });
});

describe("voiding a count", () => {
  it("takes loss and gain back out of both books", async () => {
    const before = await booksOf(outfit.id);
    for (const gross of ["71.25", "123.4567"]) {
      const counted = await bench.count(binId, gross);
      expect(await booksOf(outfit.id)).not.toEqual(before);
      const voided = await bench.voidCount(counted.id);
      expect([voided.status, voided.body.voidedAt === null]).toEqual([200, false]);
      expect(await booksOf(outfit.id)).toEqual(before);
    }
  });

  it("twice is refused, and by others than who counted or the owner", async () => {
    const sorters = await bench.count(binId, "90", {}, { role: "sorter" });
    const owners = await bench.count(binId, "85");
    expect((await bench.voidCount(owners.id, { role: "sorter" })).status).toBe(403);
    expect((await bench.voidCount(sorters.id, { role: "sorter" })).status).toBe(200);
    expect((await bench.voidCount(sorters.id)).status).toBe(409);
    expect((await bench.voidCount(owners.id)).status).toBe(200);
  });

  it("is refused with how much when what it found went out since", async () => {
    const found = await bench.count(binId, "110");
    await bench.count(binId, "4");
    const before = await booksOf(outfit.id);
    const refused = await bench.voidCount(found.id);
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toContain("C2-1 would go 6 lb below zero");
    expect(await booksOf(outfit.id)).toEqual(before);
    expect((await bench.seeCounts()).body.items.every((count) => count.voidedAt === null)).toBe(true);
  });
});

describe("a count that cannot be", () => {
  it("names the field and books nothing", async () => {
    const before = await booksOf(outfit.id);
    const other = await makeOutfit();
    const good = { binId, gross: "90", tare: "2" };
    const wrong: [string, Record<string, unknown>][] = [
      ["tare", { gross: "1", tare: "2" }],
      ["gross", { gross: "1", tare: undefined }],
      ["gross", { gross: undefined }],
      ["gross", { gross: "-1" }],
      ["gross", { gross: 90 }],
      ["binId", { binId: newId() }],
      ["binId", { binId: await benchOf(other).bin("no2-copper") }],
      ["countedOn", { countedOn: "2099-01-01" }],
      ["countedOn", { countedOn: "2026-02-30" }],
      ["note", { note: "x".repeat(2001) }],
    ];
    for (const [path, change] of wrong) expectFieldError(await bench.tryCount({ ...good, ...change }), path);
    expect(await booksOf(outfit.id)).toEqual(before);
    expect((await bench.seeCounts()).body.items).toEqual([]);
  });

  it("is dated in a closed month, whatever it finds", async () => {
    await bench.closeMonth("2026-01");
    for (const gross of ["90", "102"]) expect((await bench.tryCount({ binId, gross, tare: "2" })).status).toBe(409);
    expect((await bench.seeCounts()).body.items).toEqual([]);
  });

  it("is made by a collector or bookkeeper", async () => {
    for (const role of ["collector", "bookkeeper"] as const) {
      expect((await bench.tryCount({ binId, gross: "90" }, { role })).status).toBe(403);
      expect((await bench.seeCounts({}, role)).status).toBe(200);
    }
  });

  it("is another outfit's", async () => {
    const counted = await bench.count(binId, "90");
    const other = benchOf(await makeOutfit());
    expect((await other.voidCount(counted.id)).status).toBe(404);
    expect((await other.seeCounts()).body.items).toEqual([]);
    expect((await other.seeCounts({ binId })).body.items).toEqual([]);
  });
});
