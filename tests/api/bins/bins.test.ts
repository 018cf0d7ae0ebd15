import { afterEach, beforeEach, describe, expect, it } from "vitest";
import * as tickets from "@/app/api/o/[outfit]/tickets/route";
import * as ticketPost from "@/app/api/o/[outfit]/tickets/[id]/post/route";
import * as ticketVoid from "@/app/api/o/[outfit]/tickets/[id]/void/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import { database } from "@/db/client";
import type { Bin } from "@/lib/bins/schema";
import { gradeStockList } from "@/lib/bins/queries";
import { newId } from "@/lib/ids";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { expectTrueBooks } from "../pickups/books-of";
import { benchOf, DAY, expectFieldError } from "./bench";

let outfit: TestOutfit;
let bench: ReturnType<typeof benchOf>;

beforeEach(async () => {
  outfit = await makeOutfit();
  bench = benchOf(outfit);
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

/** A ticket over what is in a bin; its id. */
async function draftTicket(binId: string, grade: string, net: string): Promise<string> {
  const key = outfit.keys.owner;
  const yard = await call<{ id: string }>(yards.POST, outfit, { key, body: { name: `Northgate Metals ${newId().slice(-6)}` } });
  const lines = [{ gradeId: outfit.grade(grade), binId, net, price: "1", per: "lb", amountMinor: 100 * Number.parseInt(net, 10) }];
  const totalMinor = lines[0]?.amountMinor;
  const made = await call<{ id: string }>(tickets.POST, outfit, {
    key,
    body: { yardId: yard.body.id, number: newId().slice(-12), ticketOn: DAY, lines, totalMinor },
  });
  expect(made.status, JSON.stringify(made.body)).toBe(201);
  return made.body.id;
}

describe("adding a bin", () => {
  it("answers with all there is to know of it, empty and at its first version", async () => {
    const id = newId();
    const answer = await bench.tryBin(
      { id, label: " C2-1 ", gradeId: outfit.grade("no2-copper"), tare: "4.50", place: "by the door", sellPoint: "300" },
      { role: "sorter" },
    );
    expect(answer.status).toBe(201);
    expect(answer.headers.get("etag")).toBe('"1"');
    const bin: Bin = {
      id,
      label: "C2-1",
      gradeId: outfit.grade("no2-copper"),
      gradeName: answer.body.gradeName,
      family: "copper",
      place: "by the door",
      tare: "4.5",
      sellPoint: "300",
      balance: "0",
      heldSince: null,
      putAwayAt: null,
      version: 1,
    };
    expect(answer.body).toEqual(bin);
    expect((await bench.seeBin(id, "bookkeeper")).body).toEqual(bin);
    expect((await bench.seeBins({}, "collector")).body).toEqual({ items: [bin], nextCursor: null });
  });

  it("needs no more than a label and a grade", async () => {
    const answer = await bench.tryBin({ label: "S-1", gradeId: outfit.grade("shred") });
    expect(answer.body).toMatchObject({ tare: "0", place: null, sellPoint: null });
  });

  it("takes a label once an outfit", async () => {
    await bench.bin("no2-copper", { label: "C2-1" });
    const again = await bench.tryBin({ label: "C2-1", gradeId: outfit.grade("shred") });
    expect([again.status, again.problem.errors?.[0]?.path]).toEqual([409, "label"]);
    const elsewhere = await makeOutfit();
    expect((await benchOf(elsewhere).tryBin({ label: "C2-1", gradeId: elsewhere.grade("shred") })).status).toBe(201);
  });

  it("sent again with its key is one bin", async () => {
    const body = { label: "C2-1", gradeId: outfit.grade("no2-copper") };
    const headers = { "idempotency-key": newId() };
    const [first, second] = [await bench.tryBin(body, { headers }), await bench.tryBin(body, { headers })];
    expect([second.status, second.body, second.headers.get("idempotency-replayed")]).toEqual([201, first.body, "true"]);
    expect((await bench.seeBins()).body.items).toHaveLength(1);
  });

  it("names the field that is wrong", async () => {
    const good = { label: "C2-1", gradeId: outfit.grade("no2-copper") };
    const wrong: [string, unknown][] = [
      ["label", ""],
      ["label", "x".repeat(31)],
      ["gradeId", newId()],
      ["gradeId", (await makeOutfit()).grade("no2-copper")],
      ["tare", "-1"],
      ["tare", 4.5],
      ["tare", "1.00001"],
      ["sellPoint", "10000000"],
      ["place", "two\nlines"],
    ];
    for (const [path, value] of wrong) expectFieldError(await bench.tryBin({ ...good, [path]: value }), path);
    expect((await bench.tryBin({ ...good, balance: "100" })).status).toBe(422);
    expect((await bench.seeBins()).body.items).toEqual([]);
  });
});

describe("the list of bins", () => {
  it("comes in the order of the grades, without those put away unless all are asked for, and by grade", async () => {
    const shred = await bench.bin("shred", { label: "S-1" });
    const second = await bench.bin("no2-copper", { label: "C2-2" });
    const first = await bench.bin("no2-copper", { label: "C2-1" });
    const idsOf = async (query: Record<string, string>) => (await bench.seeBins(query)).body.items.map((bin) => bin.id);
    expect(await idsOf({})).toEqual([first, second, shred]);
    await bench.change(second, 1, { putAway: true });
    expect(await idsOf({})).toEqual([first, shred]);
    expect(await idsOf({ all: "true" })).toEqual([first, second, shred]);
    expect(await idsOf({ gradeId: outfit.grade("shred") })).toEqual([shred]);
    expectFieldError(await bench.seeBins({ all: "yes" }), "all");
  });

  it("adds up a grade over its bins: weight, cost, oldest day and sell points", async () => {
    const first = await bench.bin("no2-copper", { sellPoint: "100" });
    const second = await bench.bin("no2-copper", { sellPoint: "50.5" });
    await bench.bin("shred");
    await bench.weigh(first, "20", { pickupId: await bench.haul("20", 1500) });
    await bench.weigh(second, "12.5", { weighedOn: "2026-01-10" });
    const of = (gradeId: string) => ({ gradeId: outfit.grade(gradeId) });
    expect(await gradeStockList(database(), { outfitId: outfit.id })).toMatchObject([
      { ...of("no2-copper"), family: "copper", quantity: "32.5", costMinor: 1500, bins: 2, heldSince: "2026-01-10", sellPoint: "150.5" },
      { ...of("shred"), quantity: "0", costMinor: 0, bins: 1, heldSince: null, sellPoint: null },
    ]);
  });
});

describe("changing a bin", () => {
  it("sets what was sent, leaves the rest, and counts the version up", async () => {
    const id = await bench.bin("no2-copper", { label: "C2-1", tare: "4.5", place: "by the door", sellPoint: "300" });
    const changed = await bench.change(id, 1, { label: "C2-9", tare: "5.25" }, "sorter");
    expect([changed.status, changed.headers.get("etag")]).toEqual([200, '"2"']);
    expect(changed.body).toMatchObject({ label: "C2-9", tare: "5.25", place: "by the door", sellPoint: "300", version: 2 });
    expect((await bench.change(id, 2, { place: null, sellPoint: null })).body).toMatchObject({ place: null, sellPoint: null, version: 3 });
  });

  it("is refused on a version that somebody changed since, with the bin as it is now", async () => {
    const id = await bench.bin("no2-copper");
    const answers = await Promise.all(["5", "6"].map((tare) => bench.change(id, 1, { tare })));
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 412]);
    const stale = answers.find((answer) => answer.status === 412);
    expect(stale?.problem.current).toEqual((await bench.seeBin(id)).body);
    expectFieldError(await bench.change(id, Number.NaN, { tare: "5" }), "If-Match");
  });

  it("does not take another bin's label", async () => {
    await bench.bin("no2-copper", { label: "C2-1" });
    const id = await bench.bin("no2-copper", { label: "C2-2" });
    const answer = await bench.change(id, 1, { label: "C2-1" });
    expect([answer.status, answer.problem.errors?.[0]?.path]).toEqual([409, "label"]);
  });

  it("gives it another grade while nothing was ever booked, and never after", async () => {
    const id = await bench.bin("no2-copper");
    const gradeId = outfit.grade("shred");
    expectFieldError(await bench.change(id, 1, { gradeId: (await makeOutfit()).grade("shred") }), "gradeId");
    expect((await bench.change(id, 1, { gradeId })).body).toMatchObject({ gradeId, family: "steel" });
    const weighIn = await bench.weigh(id, "5");
    await bench.voidWeighIn(weighIn.id);
    const refused = await bench.change(id, 2, { gradeId: outfit.grade("no2-copper") });
    expect([refused.status, (await bench.seeBin(id)).body.gradeId]).toEqual([409, gradeId]);
    // A form that sends all its fields sends the grade as it is.
    expect((await bench.change(id, 2, { gradeId, tare: "3" })).body).toMatchObject({ gradeId, tare: "3", version: 3 });
  });

  it("keeps its grade when a count found it empty or a draft ticket names it", async () => {
    const counted = await bench.bin("no2-copper");
    await bench.count(counted, "0");
    const named = await bench.bin("no2-copper");
    await draftTicket(named, "no2-copper", "5");
    for (const id of [counted, named]) {
      const refused = await bench.change(id, 1, { gradeId: outfit.grade("shred") });
      expect([refused.status, refused.problem.errors?.[0]?.path], JSON.stringify(refused.body)).toEqual([409, "gradeId"]);
    }
  });

  it("puts it away only when empty, and back into use", async () => {
    const id = await bench.bin("no2-copper", { label: "C2-1" });
    const weighIn = await bench.weigh(id, "12.4");
    const refused = await bench.change(id, 1, { putAway: true });
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toContain("12.4 lb");
    await bench.voidWeighIn(weighIn.id);
    expect((await bench.change(id, 1, { putAway: true })).body.putAwayAt).not.toBeNull();
    expect((await bench.tryWeighIn({ binId: id, gross: "5", tare: "0" })).status).toBe(409);
    expect((await bench.tryCount({ binId: id, gross: "5" })).status).toBe(409);
    expect((await bench.change(id, 2, { putAway: false })).body.putAwayAt).toBeNull();
    expect((await bench.weigh(id, "5")).binBalance).toBe("5");
  });

  it("never hides metal that came back into a bin after it was put away", async () => {
    const id = await bench.bin("no2-copper");
    await bench.weigh(id, "5");
    const ticket = await draftTicket(id, "no2-copper", "5");
    const key = outfit.keys.owner;
    expect((await call(ticketPost.POST, outfit, { key, params: { id: ticket }, body: {} })).status).toBe(200);
    expect((await bench.change(id, 1, { putAway: true })).status).toBe(200);
    expect((await call(ticketVoid.POST, outfit, { key, params: { id: ticket }, body: {} })).status).toBe(200);
    expect((await bench.seeBins()).body.items.map((bin) => [bin.id, bin.balance])).toEqual([[id, "5"]]);
    expect(await gradeStockList(database(), { outfitId: outfit.id })).toMatchObject([{ quantity: "5", bins: 1 }]);
  });
});

describe("who may", () => {
  it("see bins: everybody; add and change them: owner and sorter", async () => {
    const id = await bench.bin("no2-copper");
    for (const role of ["bookkeeper", "collector"] as const) {
      expect((await bench.tryBin({ label: role, gradeId: outfit.grade("shred") }, { role })).status).toBe(403);
      expect((await bench.change(id, 1, { tare: "1" }, role)).status).toBe(403);
      expect((await bench.seeBin(id, role)).status).toBe(200);
      expect((await bench.seeBins({}, role)).status).toBe(200);
    }
  });

  it("not reach another outfit's bin", async () => {
    const other = await makeOutfit();
    const foreign = await benchOf(other).bin("no2-copper");
    for (const id of [foreign, newId(), "C2-1", "🪙"]) {
      expect((await bench.seeBin(id)).status).toBe(404);
      expect((await bench.change(id, 1, { tare: "1" })).status).toBe(404);
    }
    expect((await benchOf(other).seeBin(foreign)).body).toMatchObject({ tare: "0", version: 1 });
    expect((await benchOf({ ...outfit, slug: other.slug }).seeBins()).status).not.toBe(200);
  });
});
