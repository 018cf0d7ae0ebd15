import { beforeEach, describe, expect, it } from "vitest";
import * as prices from "@/app/api/o/[outfit]/prices/route";
import * as sheets from "@/app/api/o/[outfit]/price-sheets/route";
import * as sheet from "@/app/api/o/[outfit]/price-sheets/[id]/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import * as yard from "@/app/api/o/[outfit]/yards/[id]/route";
import { database } from "@/db/client";
import { outfits } from "@/db/schema";
import { eq } from "drizzle-orm";
import type { Prices, Sheet, Yard } from "@/lib/prices/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

let outfit: TestOutfit;
let gradeId: string;

beforeEach(async () => {
  outfit = await makeOutfit();
  gradeId = outfit.grade("no2-copper");
});

async function make<T>(handler: Parameters<typeof call>[0], body: unknown): Promise<T> {
  const made = await call<T>(handler, outfit, { key: outfit.keys.owner, body });
  expect(made.status, JSON.stringify(made.body)).toBe(201);
  return made.body;
}

const addYard = async (name: string) => (await make<Yard>(yards.POST, { name })).id;
const addSheet = (yardId: string, inForceFrom: string, price: string, more: Record<string, unknown> = {}) =>
  make<Sheet>(sheets.POST, { yardId, inForceFrom, lines: [{ gradeId, price, per: "lb", ...(more.line as object) }], ...(more.sheet as object) });
const on = async (day: string) => (await call<Prices>(prices.GET, outfit, { key: outfit.keys.owner, query: { on: day } })).body;

describe("the price in force", () => {
  it("is that of the sheet with the latest start on or before the day, until the yard's next sheet", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "3.90");
    await addSheet(yardId, "2026-01-12", "4.02");
    expect((await on("2026-01-04")).grades).toEqual([]);
    expect((await on("2026-01-11")).grades[0]?.best?.price).toBe("3.9");
    expect((await on("2026-01-12")).grades[0]?.best).toMatchObject({ price: "4.02", ageDays: 0, stale: false });
  });

  it("ends with the sheet's own last day, and an older sheet does not come back", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "3.90");
    await addSheet(yardId, "2026-01-12", "4.02", { sheet: { lastDay: "2026-01-14" } });
    expect((await on("2026-01-14")).grades).toHaveLength(1);
    expect((await on("2026-01-15")).grades).toEqual([]);
  });

  it("is best where it is highest per book unit, whatever unit the yard quotes in", async () => {
    const near = await addYard("Northgate Metals");
    const far = await addYard("Pell Street Scrap");
    await addSheet(near, "2026-01-05", "4.05");
    // $9,000 a tonne is $4.08233133 a pound (exact: 0.45359237 kg a pound, NIST Handbook 44, Appendix C).
    await addSheet(far, "2026-01-05", "9000", { line: { per: "tonne" } });
    const [grade] = (await on("2026-01-06")).grades;
    expect(grade?.best).toMatchObject({ yardName: "Pell Street Scrap", price: "9000", per: "tonne", normalised: "4.08233133" });
    expect(grade?.yards).toHaveLength(2);
  });

  it("of a yard out of use does not count", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "4.05");
    const away = await call<Yard>(yard.PATCH, outfit, {
      method: "PATCH",
      key: outfit.keys.owner,
      params: { id: yardId },
      body: { active: false },
      headers: { "if-match": '"1"' },
    });
    expect([away.status, away.body.active]).toEqual([200, false]);
    expect((await on("2026-01-06")).grades).toEqual([]);
  });

  it("per piece is shown but not compared", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "12", { line: { per: "each" } });
    const [grade] = (await on("2026-01-06")).grades;
    expect([grade?.best, grade?.yards[0]?.normalised]).toEqual([null, null]);
  });

  it("older than the outfit's limit is stale", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "4.05");
    expect((await on("2026-01-12")).grades[0]?.best?.stale).toBe(false);
    expect((await on("2026-01-13")).grades[0]?.best?.stale).toBe(true);
  });
});

describe("a price sheet", () => {
  it("stands once a yard and day, with one price a grade", async () => {
    const yardId = await addYard("Northgate Metals");
    await addSheet(yardId, "2026-01-05", "3.90");
    const same = await call(sheets.POST, outfit, {
      key: outfit.keys.owner,
      body: { yardId, inForceFrom: "2026-01-05", lines: [{ gradeId, price: "4", per: "lb" }] },
    });
    expect([same.status, same.problem.errors?.[0]?.path]).toEqual([409, "inForceFrom"]);
    const lines = [
      { gradeId, price: "4", per: "lb" },
      { gradeId, price: "5", per: "lb" },
    ];
    const twice = await call(sheets.POST, outfit, { key: outfit.keys.owner, body: { yardId, inForceFrom: "2026-01-06", lines } });
    expect([twice.status, twice.problem.errors?.[0]?.path]).toEqual([422, "lines.1.gradeId"]);
  });

  it("is typed again as a whole, and a late change is refused with the sheet as it is", async () => {
    const yardId = await addYard("Northgate Metals");
    const made = await addSheet(yardId, "2026-01-05", "3.90");
    const change = (price: string) =>
      call<Sheet>(sheet.PATCH, outfit, {
        method: "PATCH",
        key: outfit.keys.bookkeeper,
        params: { id: made.id },
        body: { inForceFrom: "2026-01-05", lines: [{ gradeId, price, per: "lb", yardWording: "#2 COPPER" }] },
        headers: { "if-match": '"1"' },
      });
    expect((await change("3.95")).body.lines).toMatchObject([{ price: "3.95", yardWording: "#2 COPPER" }]);
    const late = await change("3.99");
    expect([late.status, (late.problem.current as Sheet).lines[0]?.price]).toEqual([412, "3.95"]);
  });

  it("is added by a collector but changed only by the office", async () => {
    const yardId = await addYard("Northgate Metals");
    const body = { yardId, inForceFrom: "2026-01-05", lines: [{ gradeId, price: "4", per: "lb" }] };
    const made = await call<Sheet>(sheets.POST, outfit, { key: outfit.keys.collector, body });
    expect(made.status).toBe(201);
    const change = await call(sheet.PATCH, outfit, {
      method: "PATCH",
      key: outfit.keys.collector,
      params: { id: made.body.id },
      body: { inForceFrom: "2026-01-05", lines: body.lines },
      headers: { "if-match": '"1"' },
    });
    expect(change.status).toBe(403);
  });
});

it("an owner who hides prices hides them from collectors and sorters, not from the bookkeeper", async () => {
  await database().update(outfits).set({ hidesMoney: true }).where(eq(outfits.id, outfit.id));
  const seen = async (role: "collector" | "sorter" | "bookkeeper") => (await call(prices.GET, outfit, { key: outfit.keys[role] })).status;
  expect([await seen("collector"), await seen("sorter"), await seen("bookkeeper")]).toEqual([403, 403, 200]);
});
