import { and, eq } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import * as check from "@/app/api/o/[outfit]/books/check/route";
import * as entryList from "@/app/api/o/[outfit]/entries/route";
import * as movementList from "@/app/api/o/[outfit]/movements/route";
import { database } from "@/db/client";
import { accountBalances, accountMonths, binBalances, gradeStock, lots } from "@/db/schema";
import { addMinor } from "@/lib/arithmetic/money";
import { isZero, sum } from "@/lib/arithmetic/decimal";
import type { RouteHandler } from "@/lib/http/route";
import type { Entry, Movement } from "@/lib/money/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { deskOf } from "./desk";

let outfit: TestOutfit;
let desk: ReturnType<typeof deskOf>;
let pickupId = "";
let binId = "";
let yardId = "";
let ticketId = "";

beforeEach(async () => {
  outfit = await makeOutfit();
  desk = deskOf(outfit);
  [binId, yardId] = [await desk.bin("no2-copper"), await desk.yard("Pell Street Scrap")];
  pickupId = await desk.haul("2026-02-27", 5000);
  await desk.weigh(binId, "40", "2026-03-03", { pickupId });
  ticketId = await desk.sell(yardId, "2026-03-10", { grade: "no2-copper", binId, net: "10", price: "4", amountMinor: 4000 });
  await desk.cost("2026-03-11", 700);
});

type Page<T> = { items: T[]; nextCursor: string | null };
const read = async <T>(handler: RouteHandler, query: Record<string, string> = {}): Promise<T> => {
  const answer = await call<T>(handler, outfit, { key: outfit.keys.bookkeeper, query });
  expect(answer.status, JSON.stringify(answer.body)).toBe(200);
  return answer.body;
};
const kinds = (page: Page<Entry | Movement>) => page.items.map((record) => record.kind);

describe("GET /entries", () => {
  it("has every entry with all its postings, newest first, each summing to zero", async () => {
    const page = await read<Page<Entry>>(entryList.GET);
    expect(kinds(page)).toEqual(["cost", "ticket", "weigh-in", "pickup"]);
    for (const entry of page.items) expect(addMinor(...entry.postings.map((posting) => posting.amountMinor))).toBe(0);
    expect(page.items[1]?.postings.find((posting) => posting.account === "scrap-sales")).toMatchObject({
      accountName: "Scrap sales",
      amountMinor: -4000,
      gradeId: outfit.grade("no2-copper"),
      yardName: "Pell Street Scrap",
      ticketId,
    });
  });

  it("finds the entries behind a number: by month, account, grade, yard, pickup, ticket, document", async () => {
    const grade = outfit.grade("no2-copper");
    const asked: [Record<string, string>, string[]][] = [
      [{ month: "2026-02" }, ["pickup"]],
      [{ from: "2026-03-10", to: "2026-03-11" }, ["cost", "ticket"]],
      [{ month: "2026-03", account: "scrap-sales", gradeId: grade }, ["ticket"]],
      [{ account: "scrap-stock", month: "2026-03" }, ["ticket", "weigh-in"]],
      [{ account: "fuel" }, ["cost"]],
      [{ account: "no such account" }, []],
      [{ yardId }, ["ticket"]],
      [{ pickupId }, ["weigh-in", "pickup"]],
      [{ ticketId }, ["ticket"]],
      [{ documentType: "ticket" }, ["ticket"]],
      [{ documentType: "pickup", documentId: pickupId }, ["pickup"]],
      [{ month: "2026-01", from: "2026-02-01" }, []],
    ];
    for (const [query, found] of asked) expect(kinds(await read<Page<Entry>>(entryList.GET, query)), JSON.stringify(query)).toEqual(found);
  });
});

describe("GET /movements", () => {
  it("has every movement with all its lines, newest first, each summing to zero", async () => {
    const page = await read<Page<Movement>>(movementList.GET);
    expect(kinds(page)).toEqual(["ticket", "weigh-in", "pickup"]);
    for (const movement of page.items) expect(isZero(sum(movement.lines.map((line) => line.quantity)))).toBe(true);
    expect(page.items[0]?.lines.find((line) => line.place === "sold")).toMatchObject({ quantity: "10", gradeId: outfit.grade("no2-copper"), binId: null });
  });

  it("finds the movements behind a weight: by month, place, grade, bin, pickup, document", async () => {
    const asked: [Record<string, string>, string[]][] = [
      [{ month: "2026-03", place: "sold", gradeId: outfit.grade("no2-copper") }, ["ticket"]],
      [{ place: "pile" }, ["weigh-in", "pickup"]],
      [{ binId }, ["ticket", "weigh-in"]],
      [{ pickupId }, ["weigh-in", "pickup"]],
      [{ place: "load" }, []],
      [{ documentType: "ticket", documentId: ticketId }, ["ticket"]],
    ];
    for (const [query, found] of asked) expect(kinds(await read<Page<Movement>>(movementList.GET, query)), JSON.stringify(query)).toEqual(found);
  });
});

describe.each([
  ["entries", entryList.GET],
  ["movements", movementList.GET],
] as const)("GET /%s", (_name, handler) => {
  it("pages through everything once, also over several records of one day", async () => {
    for (let n = 0; n < 3; n += 1) await desk.haul("2026-03-03", 100);
    const all = (await read<Page<Entry>>(handler)).items.map((record) => record.id);
    const paged: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Page<Entry> = await read<Page<Entry>>(handler, { limit: "2", ...(cursor === null ? {} : { cursor }) });
      paged.push(...page.items.map((record) => record.id));
      cursor = page.nextCursor;
    } while (cursor !== null);
    expect(paged).toEqual(all);
    expect(new Set(paged).size).toBe(all.length);
  });

  it("is for the owner and the bookkeeper, of their own outfit", async () => {
    const other = await makeOutfit();
    for (const role of ["collector", "sorter"] as const) expect((await call(handler, outfit, { key: outfit.keys[role] })).status).toBe(403);
    expect((await call(handler, outfit, { key: other.keys.owner })).status).toBe(404);
    expect((await call<Page<Entry>>(handler, other, { key: other.keys.owner, query: { pickupId } })).body.items).toEqual([]);
  });

  it("refuses what makes no sense", async () => {
    const nonsense: Record<string, string>[] = [
      { month: "2026-13" },
      { gradeId: "copper" },
      { documentId: pickupId },
      { from: "2026-03-02", to: "2026-03-01" },
      { cursor: "abc" },
      { limit: "1000" },
      { what: "all" },
    ];
    for (const query of nonsense) expect((await call(handler, outfit, { key: outfit.keys.owner, query })).status, JSON.stringify(query)).toBe(422);
  });
});

type Check = { items: { rule: string; holds: boolean; detail: string }[]; holds: boolean };

describe("GET /books/check", () => {
  it("A-12: holds for books that only the API has written", async () => {
    const { items, holds } = await read<Check>(check.GET);
    expect(holds).toBe(true);
    expect(items.length).toBeGreaterThan(10);
    expect(items.every((item) => item.holds)).toBe(true);
  });

  it.each([
    [
      "an account's balance",
      /account balance/,
      () =>
        database()
          .update(accountBalances)
          .set({ balanceMinor: 1 })
          .where(and(eq(accountBalances.outfitId, outfit.id), eq(accountBalances.account, "fuel"))),
    ],
    [
      "a monthly total",
      /monthly total/,
      () =>
        database()
          .update(accountMonths)
          .set({ amountMinor: 1 })
          .where(and(eq(accountMonths.outfitId, outfit.id), eq(accountMonths.account, "fuel"))),
    ],
    ["a bin", /bin's balance/, () => database().update(binBalances).set({ quantity: "31" }).where(eq(binBalances.outfitId, outfit.id))],
    ["a grade's weight", /every grade/, () => database().update(gradeStock).set({ quantity: "31" }).where(eq(gradeStock.outfitId, outfit.id))],
    ["a grade's cost", /Scrap stock equals/, () => database().update(gradeStock).set({ costMinor: 1 }).where(eq(gradeStock.outfitId, outfit.id))],
    ["a lot", /every pickup/, () => database().update(lots).set({ remainingWeight: "1" }).where(eq(lots.outfitId, outfit.id))],
  ])("finds a balance that was changed by hand: %s", async (_what, rule, plant) => {
    await plant();
    const { items, holds } = await read<Check>(check.GET);
    expect(holds).toBe(false);
    const broken = items.filter((item) => !item.holds);
    expect(broken.some((item) => rule.test(item.rule) && item.detail.includes("off by"))).toBe(true);
  });

  it("is for the owner and the bookkeeper", async () => {
    for (const role of ["collector", "sorter"] as const) expect((await call(check.GET, outfit, { key: outfit.keys[role] })).status).toBe(403);
  });
});
