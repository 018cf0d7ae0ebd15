import { sql, type SQL } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { databaseErrorNumber, databaseErrorText } from "@/db/transaction";
import { newId } from "@/lib/ids";
import { makeOutfit, type TestOutfit } from "../api/outfit";
import { deskOf } from "../api/money/desk";

/** What the database itself refuses, whoever holds the connection. */

let outfit: TestOutfit;
let foreign: TestOutfit;
let binId = "";
let foreignBin = "";

beforeAll(async () => {
  outfit = await makeOutfit();
  foreign = await makeOutfit();
  const desk = deskOf(outfit);
  binId = await desk.bin("no2-copper");
  foreignBin = await deskOf(foreign).bin("no2-copper");
  const pickupId = await desk.haul("2026-03-02", 5000);
  await desk.weigh(binId, "40", "2026-03-03", { pickupId });
});

/** Runs a statement that must be refused, and says how the database refused it. */
async function refusal(statement: SQL): Promise<{ number: number | null; text: string }> {
  const error: unknown = await database()
    .execute(statement)
    .then(
      () => null,
      (reason: unknown) => reason,
    );
  expect(error, "the database took it").not.toBeNull();
  return { number: databaseErrorNumber(error), text: databaseErrorText(error) };
}

const BOOKS = ["movements", "movement_lines", "entries", "postings", "audit_log"];

describe.each(BOOKS)("%s", (table) => {
  const name = sql.raw(table);
  it("rows are never changed", async () => {
    expect((await refusal(sql`update ${name} set outfit_id = outfit_id where outfit_id = ${outfit.id}`)).text).toContain("append-only");
  });
  it("rows are never removed", async () => {
    expect((await refusal(sql`delete from ${name} where outfit_id = ${outfit.id}`)).text).toContain("append-only");
  });
});

const MISSING_REFERENCE = 1452;
const CHECK_FAILED = 4025;

describe("nothing points across outfits", () => {
  const line = (of: TestOutfit, bin: string, grade: string) =>
    sql`insert into movement_lines (outfit_id, movement_id, line, place, bin_id, grade_id, quantity, occurred_on)
      select ${of.id}, id, 99, 'bin', ${bin}, ${grade}, 1, occurred_on from movements where outfit_id = ${of.id} limit 1`;

  it("a line cannot use another outfit's bin or grade, nor a bin of another grade", async () => {
    expect((await refusal(line(outfit, foreignBin, foreign.grade("no2-copper")))).number).toBe(MISSING_REFERENCE);
    expect((await refusal(line(outfit, binId, foreign.grade("no2-copper")))).number).toBe(MISSING_REFERENCE);
    expect((await refusal(line(outfit, binId, outfit.grade("shred")))).number).toBe(MISSING_REFERENCE);
  });

  it("a posting cannot join another outfit's entry, and a member of another outfit makes no entry", async () => {
    const posting = sql`insert into postings (outfit_id, entry_id, line, account, amount_minor, occurred_on)
      select ${foreign.id}, id, 99, 'cash', 1, occurred_on from entries where outfit_id = ${outfit.id} limit 1`;
    expect((await refusal(posting)).number).toBe(MISSING_REFERENCE);
    const entry = sql`insert into entries (outfit_id, id, sequence, occurred_on, kind, document_type, document_id, made_by, made_at)
      values (${outfit.id}, ${newId()}, 999, '2026-03-02', 'cost', 'cost', ${newId()}, ${foreign.members.owner}, now(3))`;
    expect((await refusal(entry)).number).toBe(MISSING_REFERENCE);
  });
});

describe("balances below zero", () => {
  it.each([
    ["a bin", sql`update bin_balances set quantity = -0.0001 where outfit_id = `],
    ["a grade's weight", sql`update grade_stock set quantity = -1, cost_minor = 0 where outfit_id = `],
    ["a grade's cost", sql`update grade_stock set cost_minor = -1 where outfit_id = `],
    ["cost without metal", sql`update grade_stock set quantity = 0, cost_minor = 5 where outfit_id = `],
    ["a lot", sql`update lots set remaining_weight = -1 where outfit_id = `],
  ])("are refused: %s", async (_what, statement) => {
    expect((await refusal(sql`${statement}${outfit.id}`)).number).toBe(CHECK_FAILED);
  });

  it("a record is taken back once only", async () => {
    const head = (id: string) => sql`insert into entries (outfit_id, id, sequence, occurred_on, kind, document_type, document_id, reverses_id, made_by, made_at)
      select outfit_id, ${id}, 1000, occurred_on, kind, document_type, document_id, id, made_by, now(3) from entries where outfit_id = ${outfit.id} and reverses_id is null order by sequence limit 1`;
    await database().execute(head(newId()));
    expect((await refusal(head(newId()))).number).toBe(1062);
  });
});
