import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { newId } from "@/lib/ids";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks, lotOf } from "../pickups/books-of";
import { benchOf, DAY, expectFieldError, linesOf } from "./bench";

let outfit: TestOutfit;
let bench: ReturnType<typeof benchOf>;
let gradeId: string;
let binId: string;

beforeEach(async () => {
  outfit = await makeOutfit();
  bench = benchOf(outfit);
  gradeId = outfit.grade("no2-copper");
  binId = await bench.bin("no2-copper", { label: "C2-1", tare: "2" });
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

describe("a weigh-in from outside", () => {
  it("puts gross less tare into the bin at no cost and answers with what the bin holds now", async () => {
    const answer = await bench.tryWeighIn({ binId, gross: "14.25", tare: "1.85", note: "clean" }, { role: "collector" });
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({
      binId,
      binLabel: "C2-1",
      gradeId,
      family: "copper",
      weighedOn: DAY,
      pickupId: null,
      fromPile: false,
      gross: "14.25",
      tare: "1.85",
      net: "12.4",
      draws: [{ gross: "14.25", tare: "1.85" }],
      unit: "lb",
      note: "clean",
      madeBy: { id: outfit.members.collector },
      voidedAt: null,
      binBalance: "12.4",
    });
    expect(await linesOf(outfit.id, answer.body.id)).toEqual([`${DAY} outside -12.4`, `${DAY} bin 12.4`]);
    expect(await booksOf(outfit.id)).toEqual({ accounts: {}, lots: [], stock: { [gradeId]: { quantity: "12.4", costMinor: 0 } } });
    expect((await bench.seeBin(binId, "sorter")).body).toMatchObject({ balance: "12.4", heldSince: DAY });
  });

  it("adds to what is there", async () => {
    await bench.weigh(binId, "12.4", { weighedOn: "2026-01-10" });
    expect((await bench.weigh(binId, "0.0001")).binBalance).toBe("12.4001");
    expect((await bench.seeBin(binId)).body.heldSince).toBe("2026-01-10");
  });
});

describe("draws and units", () => {
  it("adds several draws up, converts the sums once, and keeps them as typed", async () => {
    // 3.0003 kg is 6.61453 lb; each draw by itself would be 2.2048 lb, 6.6144 together. 1.5 kg is 3.30693 lb.
    const draws = Array.from({ length: 3 }, () => ({ gross: "1.0001", tare: "0.5" }));
    const answer = await bench.tryWeighIn({ binId, draws, unit: "kg" });
    expect(answer.body).toMatchObject({ gross: "6.6145", tare: "3.3069", net: "3.3076", unit: "kg", draws, binBalance: "3.3076" });
  });

  it("takes the sums beside the draws when they agree and says which does not", async () => {
    const draws = [
      { gross: "10.5", tare: "2" },
      { gross: "20", tare: "2.25" },
    ];
    expect((await bench.tryWeighIn({ binId, draws, gross: "30.50", tare: "4.25" })).body.net).toBe("26.25");
    expectFieldError(await bench.tryWeighIn({ binId, draws, gross: "30" }), "gross", "30.5");
    expectFieldError(await bench.tryWeighIn({ binId, draws, tare: "4" }), "tare", "4.25");
  });

  // NIST Handbook 44, Appendix C: 1 lb is 0.45359237 kg, 16 oz; a hundredweight 100 lb, tons of 2,000 and 2,240 lb; a troy ounce 31.1034768 g.
  it.each([
    ["lb", "1", "1"],
    ["kg", "1", "2.2046"],
    ["oz", "8", "0.5"],
    ["g", "500", "1.1023"],
    ["cwt", "1.5", "150"],
    ["short-ton", "0.25", "500"],
    ["long-ton", "0.5", "1120"],
    ["tonne", "0.1", "220.4623"],
    ["ozt", "10", "0.6857"],
  ])("takes a weight in %s", async (unit, gross, net) => {
    expect((await bench.tryWeighIn({ binId, gross, tare: "0", unit })).body).toMatchObject({ net, unit, binBalance: net });
  });

  it("uses the outfit's unit when none is said", async () => {
    const metric = await makeOutfit({ weightUnit: "kg" });
    const there = benchOf(metric);
    const id = await there.bin("no2-copper");
    expect(await there.weigh(id, "12.5")).toMatchObject({ unit: "kg", net: "12.5" });
    expect(await there.weigh(id, "10", { unit: "lb" })).toMatchObject({ net: "4.5359", binBalance: "17.0359" });
    await expectTrueBooks(metric.id);
  });
});

describe("a weigh-in from a pickup", () => {
  it("draws its cost by weight, and the one that takes the rest takes what is left", async () => {
    const pickupId = await bench.haul("7", 100);
    await bench.weigh(binId, "2", { pickupId });
    // 100 x 2 / 7 = 28.57
    expect(await lotOf(outfit.id, pickupId)).toEqual({ weight: "5", costMinor: 71 });
    await bench.weigh(binId, "2", { pickupId });
    // 71 x 2 / 5 = 28.4
    expect(await lotOf(outfit.id, pickupId)).toEqual({ weight: "3", costMinor: 43 });
    const last = await bench.weigh(binId, "4.25", { pickupId });
    expect(last).toMatchObject({ pickupId, binBalance: "8.25" });
    expect(await linesOf(outfit.id, last.id)).toEqual([`${DAY} pile ${pickupId} -3`, `${DAY} variance -1.25`, `${DAY} bin 4.25`]);
    expect(await booksOf(outfit.id)).toEqual({
      accounts: { cash: -100, "scrap-stock": 100 },
      lots: [],
      stock: { [gradeId]: { quantity: "8.25", costMinor: 100 } },
    });
  });

  it("takes all the cost when it weighs just what was estimated", async () => {
    const pickupId = await bench.haul("7", 101);
    await bench.weigh(binId, "7", { pickupId });
    expect((await booksOf(outfit.id)).stock[gradeId]).toEqual({ quantity: "7", costMinor: 101 });
  });

  it("that is used up comes from variance alone", async () => {
    const pickupId = await bench.haul("7", 100);
    await bench.weigh(binId, "7", { pickupId });
    const more = await bench.weigh(binId, "1", { pickupId });
    expect(await linesOf(outfit.id, more.id)).toEqual([`${DAY} variance -1`, `${DAY} bin 1`]);
    expect((await booksOf(outfit.id)).stock[gradeId]).toEqual({ quantity: "8", costMinor: 100 });
  });

  it("is refused once that is void or worked out", async () => {
    const [voided, done] = [await bench.haul("7", 100), await bench.haul("7", 100)];
    await bench.voidHaul(voided);
    await bench.workOut(done);
    const before = await booksOf(outfit.id);
    for (const pickupId of [voided, done]) expect((await bench.tryWeighIn({ binId, gross: "1", tare: "0", pickupId })).status).toBe(409);
    expect(await booksOf(outfit.id)).toEqual(before);
  });
});

describe("a weigh-in from the pile", () => {
  it("draws from the oldest hauls first, then by number, and the rest from variance", async () => {
    const newest = await bench.haul("10", 1000, { pickedUpOn: "2026-01-12" });
    const older = await bench.haul("10", 500, { pickedUpOn: "2026-01-05" });
    const sameDay = await bench.haul("10", 300, { pickedUpOn: "2026-01-05" });
    const done = await bench.haul("10", 50, { pickedUpOn: "2026-01-01" });
    await bench.workOut(done);
    const first = await bench.weigh(binId, "15", { fromPile: true });
    expect(first).toMatchObject({ fromPile: true, pickupId: null });
    expect(await linesOf(outfit.id, first.id)).toEqual([`${DAY} pile ${older} -10`, `${DAY} pile ${sameDay} -5`, `${DAY} bin 15`]);
    expect((await booksOf(outfit.id)).stock[gradeId]).toEqual({ quantity: "15", costMinor: 650 });
    const second = await bench.weigh(binId, "20", { fromPile: true });
    expect(await linesOf(outfit.id, second.id)).toEqual([`${DAY} pile ${sameDay} -5`, `${DAY} pile ${newest} -10`, `${DAY} variance -5`, `${DAY} bin 20`]);
    expect((await booksOf(outfit.id)).stock[gradeId]).toEqual({ quantity: "35", costMinor: 1800 });
  });

  it("comes from variance when the pile is empty", async () => {
    const answer = await bench.weigh(binId, "3", { fromPile: true });
    expect(await linesOf(outfit.id, answer.id)).toEqual([`${DAY} variance -3`, `${DAY} bin 3`]);
  });
});

describe("voiding a weigh-in", () => {
  it("takes it back out of both books, wherever it came from", async () => {
    const pickupId = await bench.haul("7", 100);
    await bench.haul("7", 205);
    const before = await booksOf(outfit.id);
    for (const from of [{}, { pickupId }, { fromPile: true }]) {
      for (const net of ["3.3333", "9.5"]) {
        const made = await bench.weigh(binId, net, from);
        const voided = await bench.voidWeighIn(made.id);
        expect([voided.status, voided.body.binBalance, voided.body.voidedAt === null]).toEqual([200, "0", false]);
        expect(await booksOf(outfit.id)).toEqual(before);
      }
    }
    expect((await bench.seeBin(binId)).body).toMatchObject({ balance: "0", heldSince: null });
  });

  it("opens a haul again that was worked out since", async () => {
    const [pickupId, other] = [await bench.haul("10", 100), await bench.haul("10", 40)];
    const before = await booksOf(outfit.id);
    const named = await bench.weigh(binId, "4", { pickupId });
    const drawn = await bench.weigh(binId, "12", { fromPile: true });
    await bench.workOut(pickupId);
    await bench.workOut(other);
    expect((await booksOf(outfit.id)).lots).toEqual([]);
    for (const id of [drawn.id, named.id]) expect((await bench.voidWeighIn(id)).status).toBe(200);
    expect(await booksOf(outfit.id)).toEqual(before);
    expect((await bench.tryWeighIn({ binId, gross: "1", tare: "0", pickupId })).status).toBe(201);
  });

  it("is refused with how much when the metal went out since", async () => {
    const made = await bench.weigh(binId, "10");
    await bench.count(binId, "4");
    const before = await booksOf(outfit.id);
    const refused = await bench.voidWeighIn(made.id);
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toContain("C2-1 would go 6 lb below zero");
    expect(await booksOf(outfit.id)).toEqual(before);
    expect((await bench.seeWeighIns()).body.items[0]?.voidedAt).toBeNull();
  });

  it("is for who weighed it and the owner, and once", async () => {
    const mine = await bench.weigh(binId, "5", {}, { role: "collector" });
    const theirs = await bench.weigh(binId, "5", {}, { role: "sorter" });
    expect((await bench.voidWeighIn(mine.id, { role: "sorter" })).status).toBe(403);
    expect((await bench.voidWeighIn(mine.id, { role: "bookkeeper" })).status).toBe(403);
    expect((await bench.voidWeighIn(mine.id, { role: "collector" })).status).toBe(200);
    expect((await bench.voidWeighIn(mine.id, { role: "collector" })).status).toBe(409);
    expect((await bench.voidWeighIn(theirs.id)).status).toBe(200);
    expect((await bench.seeBin(binId)).body.balance).toBe("0");
  });

  it("by two at once takes it back once", async () => {
    const made = await bench.weigh(binId, "5");
    await bench.weigh(binId, "5");
    const answers = await Promise.all([bench.voidWeighIn(made.id), bench.voidWeighIn(made.id)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect((await bench.seeBin(binId)).body.balance).toBe("5");
  });

  it("of a closed month is dated on the first day that is open", async () => {
    const made = await bench.weigh(binId, "5");
    await bench.closeMonth("2026-01");
    expect((await bench.voidWeighIn(made.id)).status).toBe(200);
    expect(await linesOf(outfit.id, made.id)).toEqual([`${DAY} outside -5`, `${DAY} bin 5`, "2026-02-01 outside 5", "2026-02-01 bin -5"]);
  });
});

describe("many at once", () => {
  it("eight weigh-ins by three people lose nothing and cost what was paid", async () => {
    const pickupId = await bench.haul("40", 1001);
    const roles = ["owner", "collector", "sorter"] as const;
    const made = await Promise.all(
      Array.from({ length: 8 }, (_, index) =>
        bench.weigh(binId, "5.0001", index % 2 === 0 ? { pickupId } : { fromPile: true }, { role: roles[index % 3] ?? "owner" }),
      ),
    );
    expect(new Set(made.map((one) => one.binBalance)).size).toBe(8);
    expect((await bench.seeBin(binId)).body.balance).toBe("40.0008");
    expect(await booksOf(outfit.id)).toEqual({
      accounts: { cash: -1001, "scrap-stock": 1001 },
      lots: [],
      stock: { [gradeId]: { quantity: "40.0008", costMinor: 1001 } },
    });
  });

  it("the same one sent again, also at the same moment, is booked once", async () => {
    const headers = { "idempotency-key": newId() };
    const body = { binId, gross: "7", tare: "2" };
    const first = await bench.tryWeighIn(body, { headers });
    const again = await Promise.all([bench.tryWeighIn(body, { headers }), bench.tryWeighIn(body, { headers })]);
    for (const answer of again) expect([answer.status, answer.body, answer.headers.get("idempotency-replayed")]).toEqual([201, first.body, "true"]);
    expect((await bench.tryWeighIn({ ...body, gross: "8" }, { headers })).problem.type).toContain("key-reused");
    const race = { "idempotency-key": newId() };
    const raced = await Promise.all(Array.from({ length: 4 }, () => bench.tryWeighIn(body, { headers: race })));
    expect(new Set(raced.map((answer) => answer.body.id)).size).toBe(1);
    expect((await bench.seeBin(binId)).body.balance).toBe("10");
  });

  it("an id of the caller's own is taken once", async () => {
    const id = newId();
    expect((await bench.weigh(binId, "5", { id })).id).toBe(id);
    expect((await bench.tryWeighIn({ id, binId, gross: "5", tare: "0" })).status).toBe(409);
    expect((await bench.seeBin(binId)).body.balance).toBe("5");
  });
});

describe("a weigh-in that cannot be", () => {
  it("names the field and books nothing", async () => {
    const other = await makeOutfit();
    const good = { binId, gross: "14.25", tare: "1.85" };
    const two = { gross: undefined, tare: undefined };
    const wrong: [string, Record<string, unknown>][] = [
      ["tare", { gross: "1", tare: "2" }],
      ["gross", { gross: "2", tare: "2" }],
      ["gross", { gross: undefined }],
      ["tare", { tare: undefined }],
      ["gross", { gross: "-1" }],
      ["gross", { gross: 14.25 }],
      ["gross", { gross: "1.00001" }],
      ["gross", { gross: "10000000" }],
      // Half a tenth of a thousandth of a pound is nothing in the book.
      ["gross", { gross: "0.01", tare: "0", unit: "g" }],
      // Few enough digits as typed, too much for the book.
      ["gross", { gross: "9999999", tare: "0", unit: "long-ton" }],
      ["draws", { ...two, draws: Array.from({ length: 3 }, () => ({ gross: "4000000", tare: "0" })) }],
      ["unit", { unit: "stone" }],
      ["draws", { draws: [] }],
      ["draws", { draws: Array.from({ length: 51 }, () => ({ gross: "2", tare: "1" })) }],
      [
        "draws.1.tare",
        {
          ...two,
          draws: [
            { gross: "9", tare: "1" },
            { gross: "1", tare: "2" },
          ],
        },
      ],
      ["draws.0.gross", { ...two, draws: [{ gross: "x", tare: "1" }] }],
      ["binId", { binId: newId() }],
      ["binId", { binId: await benchOf(other).bin("no2-copper") }],
      ["pickupId", { pickupId: newId() }],
      ["pickupId", { pickupId: await benchOf(other).haul("7", 100) }],
      ["fromPile", { fromPile: true, pickupId: newId() }],
      ["weighedOn", { weighedOn: "2099-01-01" }],
      ["weighedOn", { weighedOn: undefined }],
    ];
    for (const [path, change] of wrong) expectFieldError(await bench.tryWeighIn({ ...good, ...change }), path);
    expect(await booksOf(outfit.id)).toEqual({ accounts: {}, lots: [], stock: {} });
    expect((await bench.seeWeighIns()).body.items).toEqual([]);
    await expectTrueBooks(other.id);
  });

  it("is dated in a closed month", async () => {
    await bench.closeMonth("2026-01");
    expect((await bench.tryWeighIn({ binId, gross: "5", tare: "0" })).status).toBe(409);
    expect((await bench.seeWeighIns()).body.items).toEqual([]);
  });

  it("is made by a bookkeeper", async () => {
    expect((await bench.tryWeighIn({ binId, gross: "5", tare: "0" }, { role: "bookkeeper" })).status).toBe(403);
    expect((await bench.seeWeighIns({}, "bookkeeper")).status).toBe(200);
  });

  it("is another outfit's", async () => {
    const made = await bench.weigh(binId, "5");
    const other = benchOf(await makeOutfit());
    expect((await other.voidWeighIn(made.id)).status).toBe(404);
    expect((await other.seeWeighIns()).body.items).toEqual([]);
    expect((await other.seeWeighIns({ binId })).body.items).toEqual([]);
  });
});

describe("the list of weigh-ins", () => {
  it("comes newest first, page by page, each once", async () => {
    const days = ["2026-01-10", "2026-01-12", "2026-01-11", "2026-01-12", "2026-01-12"];
    const made: { id: string; day: string }[] = [];
    for (const day of days) made.push({ id: (await bench.weigh(binId, "1", { weighedOn: day })).id, day });
    const expected = made.toSorted((a, b) => (a.day === b.day ? (a.id < b.id ? 1 : -1) : a.day < b.day ? 1 : -1)).map((one) => one.id);
    const seen: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof bench.seeWeighIns>> = await bench.seeWeighIns({ limit: "2", ...(cursor === null ? {} : { cursor }) });
      expect(page.body.items.length).toBeLessThanOrEqual(2);
      seen.push(...page.body.items.map((one) => one.id));
      cursor = page.body.nextCursor;
    } while (cursor !== null);
    expect(seen).toEqual(expected);
  });

  it("is filtered by bin, pickup and day", async () => {
    const pickupId = await bench.haul("7", 100);
    const second = await bench.bin("no2-copper");
    const early = await bench.weigh(binId, "1", { weighedOn: "2026-01-02" });
    const late = await bench.weigh(binId, "1", { weighedOn: "2026-01-20", pickupId });
    const elsewhere = await bench.weigh(second, "1", { weighedOn: "2026-01-10" });
    const idsOf = async (query: Record<string, string>) => (await bench.seeWeighIns(query)).body.items.map((one) => one.id);
    expect(await idsOf({ binId })).toEqual([late.id, early.id]);
    expect(await idsOf({ pickupId })).toEqual([late.id]);
    expect(await idsOf({ from: "2026-01-02", to: "2026-01-10" })).toEqual([elsewhere.id, early.id]);
    expectFieldError(await bench.seeWeighIns({ from: "yesterday" }), "from");
    expectFieldError(await bench.seeWeighIns({ cursor: "nonsense" }), "cursor");
    expectFieldError(await bench.seeWeighIns({ limit: "0" }), "limit");
  });
});
