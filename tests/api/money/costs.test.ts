import { eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import * as costs from "@/app/api/o/[outfit]/costs/route";
import { database } from "@/db/client";
import { auditLog, postings } from "@/db/schema";
import { dateIn, now, addDays } from "@/lib/clock";
import { newId } from "@/lib/ids";
import type { Cost } from "@/lib/money/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks } from "../pickups/books-of";
import { deskOf } from "./desk";

const DAY = "2026-03-05";

let outfit: TestOutfit;
let desk: ReturnType<typeof deskOf>;

beforeEach(async () => {
  outfit = await makeOutfit();
  desk = deskOf(outfit);
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

describe("POST /costs", () => {
  it.each(["fuel", "disposal", "supplies", "repairs", "other"])("books %s against what it was paid from", async (kind) => {
    await desk.cost(DAY, 4217, { kind, paidFrom: "bank" });
    expect((await booksOf(outfit.id)).accounts).toEqual({ [kind]: 4217, bank: -4217 });
  });

  it("owes own-pocket money back to the member who paid", async () => {
    await desk.cost(DAY, 990, { paidFrom: "own-pocket" }, "collector");
    const rows = await database().select().from(postings).where(eq(postings.outfitId, outfit.id));
    expect(rows.map(({ account, amountMinor, memberId }) => ({ account, amountMinor, memberId }))).toEqual([
      { account: "fuel", amountMinor: 990, memberId: null },
      { account: "owed-to-members", amountMinor: -990, memberId: outfit.members.collector },
    ]);
  });

  it("answers with the cost as it stands and writes who did it", async () => {
    const answer = await desk.tryCost({ spentOn: DAY, kind: "supplies", amountMinor: 1500, note: " blades " }, "sorter");
    expect(answer.status).toBe(201);
    expect(answer.body).toMatchObject({ spentOn: DAY, kind: "supplies", amountMinor: 1500, paidFrom: "cash", note: "blades", voidedAt: null, version: 1 });
    expect(answer.body.madeBy.id).toBe(outfit.members.sorter);
    const audited = await database().select({ action: auditLog.action }).from(auditLog).where(eq(auditLog.outfitId, outfit.id));
    expect(audited).toEqual([{ action: "add-cost" }]);
  });

  it("books once, however often the same request is sent", async () => {
    const headers = { "idempotency-key": newId() };
    const body = { spentOn: DAY, kind: "fuel", amountMinor: 4200 };
    const send = () => call<Cost>(costs.POST, outfit, { key: outfit.keys.owner, body, headers });
    const answers = await Promise.all([send(), send(), send()]);
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201]);
    expect(new Set(answers.map((answer) => answer.body.id)).size).toBe(1);
    expect((await booksOf(outfit.id)).accounts).toEqual({ fuel: 4200, cash: -4200 });
    const other = await call(costs.POST, outfit, { key: outfit.keys.owner, body: { ...body, amountMinor: 1 }, headers });
    expect(other.status).toBe(422);
  });

  it("refuses a day that lies ahead, and an id that is taken", async () => {
    const tomorrow = addDays(dateIn("America/New_York", now()), 1);
    const ahead = await desk.tryCost({ spentOn: tomorrow, kind: "fuel", amountMinor: 1 });
    expect([ahead.status, ahead.problem.errors?.[0]?.path]).toEqual([422, "spentOn"]);
    const id = newId();
    expect((await desk.tryCost({ id, spentOn: DAY, kind: "fuel", amountMinor: 100 })).status).toBe(201);
    expect((await desk.tryCost({ id, spentOn: DAY, kind: "fuel", amountMinor: 100 })).status).toBe(409);
    expect((await booksOf(outfit.id)).accounts).toEqual({ fuel: 100, cash: -100 });
  });

  it("names each wrong field, and every unknown one, and books nothing", async () => {
    const good = { spentOn: DAY, kind: "fuel", amountMinor: 100 };
    const wrong: [string, unknown][] = [
      ["amountMinor", 0],
      ["amountMinor", -5],
      ["amountMinor", 1.5],
      ["amountMinor", "100"],
      ["amountMinor", 10_000_000_001],
      ["kind", "wages"],
      ["paidFrom", "till"],
      ["spentOn", "2026-02-30"],
      ["note", "x".repeat(2001)],
      ["id", "1"],
    ];
    for (const [path, value] of wrong) {
      const answer = await desk.tryCost({ ...good, [path]: value });
      expect([answer.status, answer.problem.errors?.[0]?.path], `${path} ${String(value)}`).toEqual([422, path]);
    }
    expect((await desk.tryCost({ ...good, amount: "1" })).status).toBe(422);
    const broken = await call(costs.POST, outfit, { key: outfit.keys.owner, rawBody: '{"spentOn":', headers: { "content-type": "application/json" } });
    expect(broken.status).toBe(400);
    expect(await booksOf(outfit.id)).toEqual({ accounts: {}, lots: [], stock: {} });
  });
});

describe("own costs only", () => {
  it("a collector and a sorter see and void their own; the office all", async () => {
    const [collectors, sorters, owners] = [
      await desk.cost(DAY, 100, {}, "collector"),
      await desk.cost(DAY, 200, {}, "sorter"),
      await desk.cost(DAY, 300, {}, "owner"),
    ];
    const seen = async (role: "owner" | "bookkeeper" | "collector" | "sorter") => (await desk.costsOf(role)).body.items.map((cost) => cost.id).sort();
    expect(await seen("collector")).toEqual([collectors]);
    expect(await seen("sorter")).toEqual([sorters]);
    expect(await seen("owner")).toEqual([collectors, sorters, owners].sort());
    expect(await seen("bookkeeper")).toEqual([collectors, sorters, owners].sort());
    expect((await desk.voidCost(owners, "collector")).status).toBe(404);
    expect((await desk.voidCost(collectors, "sorter")).status).toBe(404);
    expect((await booksOf(outfit.id)).accounts).toEqual({ fuel: 600, cash: -600 });
    expect((await desk.voidCost(collectors, "collector")).status).toBe(200);
    expect((await desk.voidCost(sorters, "bookkeeper")).status).toBe(200);
    expect((await booksOf(outfit.id)).accounts).toEqual({ fuel: 300, cash: -300 });
  });

  it("another outfit's cost does not exist", async () => {
    const id = await desk.cost(DAY, 100);
    const other = await makeOutfit();
    expect((await deskOf(other).voidCost(id)).status).toBe(404);
    expect((await deskOf(other).costsOf("owner")).body.items).toEqual([]);
    expect((await desk.voidCost("not an id")).status).toBe(404);
  });
});

describe("taking a cost back", () => {
  it("leaves the books as they were, once", async () => {
    await desk.cost(DAY, 700);
    const before = await booksOf(outfit.id);
    const id = await desk.cost(DAY, 4200, { kind: "repairs", paidFrom: "own-pocket" });
    const answer = await desk.voidCost(id);
    expect(answer.body).toMatchObject({ id, version: 2 });
    expect(answer.body.voidedAt).not.toBeNull();
    expect(await booksOf(outfit.id)).toEqual(before);
    expect((await desk.voidCost(id)).status).toBe(409);
    expect(await booksOf(outfit.id)).toEqual(before);
  });
});

describe("GET /costs", () => {
  it("pages through everything once, newest first, whatever the page's size", async () => {
    const made: string[] = [];
    for (const day of ["2026-03-01", "2026-03-02", "2026-03-02", "2026-03-02", "2026-03-09"]) made.push(await desk.cost(day, 100));
    const all = (await desk.costsOf("owner")).body.items;
    expect(all.map((cost) => cost.spentOn)).toEqual(["2026-03-09", "2026-03-02", "2026-03-02", "2026-03-02", "2026-03-01"]);
    const paged: string[] = [];
    let cursor: string | null = null;
    do {
      const page: Awaited<ReturnType<typeof desk.costsOf>> = await desk.costsOf("owner", { limit: "2", ...(cursor === null ? {} : { cursor }) });
      paged.push(...page.body.items.map((cost) => cost.id));
      cursor = page.body.nextCursor;
    } while (cursor !== null);
    expect(paged).toEqual(all.map((cost) => cost.id));
    expect([...paged].sort()).toEqual([...made].sort());
  });

  it("filters by day and kind, and refuses what makes no sense", async () => {
    await desk.cost("2026-03-01", 1);
    const wanted = await desk.cost("2026-03-02", 2, { kind: "disposal" });
    await desk.cost("2026-03-02", 3);
    const found = await desk.costsOf("owner", { from: "2026-03-02", to: "2026-03-02", kind: "disposal" });
    expect(found.body.items.map((cost) => cost.id)).toEqual([wanted]);
    const nonsense: Record<string, string>[] = [
      { from: "2026-03-02", to: "2026-03-01" },
      { kind: "wages" },
      { limit: "0" },
      { limit: "201" },
      { cursor: "!" },
      { since: "1" },
    ];
    for (const query of nonsense) expect((await desk.costsOf("owner", query)).status, JSON.stringify(query)).toBe(422);
  });
});
