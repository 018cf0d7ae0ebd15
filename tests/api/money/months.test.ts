import { and, desc, eq } from "drizzle-orm";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { database } from "@/db/client";
import { auditLog, entries, postings } from "@/db/schema";
import { databaseErrorText } from "@/db/transaction";
import { dateIn, monthOf, now, shiftMonth } from "@/lib/clock";
import { newId } from "@/lib/ids";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks } from "../pickups/books-of";
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

describe("a closed month", () => {
  it("takes nothing more, and the months beside it do", async () => {
    await desk.cost("2026-03-31", 100);
    const closed = await desk.close("2026-03", "bookkeeper");
    expect(closed.status, JSON.stringify(closed.body)).toBe(200);
    expect(closed.body).toMatchObject({ month: "2026-03", closedBy: { id: outfit.members.bookkeeper } });
    expect((await desk.month("2026-03")).closedAt).toBe(closed.body.closedAt);
    for (const day of ["2026-03-01", "2026-03-31"]) {
      const refused = await desk.tryCost({ spentOn: day, kind: "fuel", amountMinor: 5 });
      expect([refused.status, refused.problem.detail.includes("2026-03 is closed")]).toEqual([409, true]);
    }
    expect((await booksOf(outfit.id)).accounts).toEqual({ fuel: 100, cash: -100 });
    await desk.cost("2026-02-28", 1);
    await desk.cost("2026-04-01", 2);
  });

  it("refuses postings and movements at the database as well", async () => {
    await desk.cost("2026-03-10", 100);
    await desk.haul("2026-03-10", 0);
    await desk.close("2026-03");
    const [entry] = await database().select().from(entries).where(eq(entries.outfitId, outfit.id));
    const written = database()
      .insert(postings)
      .values({ outfitId: outfit.id, entryId: entry?.id ?? "", line: 9, account: "fuel", amountMinor: 1, occurredOn: "2026-03-10" });
    const error: unknown = await written.then(
      () => null,
      (reason: unknown) => reason,
    );
    expect(databaseErrorText(error)).toContain("closed-month");
  });

  it("is corrected in the first open month, by a record that points back", async () => {
    const id = await desk.cost("2026-03-10", 4200);
    await desk.close("2026-03");
    await desk.close("2026-04");
    expect((await desk.voidCost(id)).status).toBe(200);
    const [taken] = await database()
      .select()
      .from(entries)
      .where(and(eq(entries.outfitId, outfit.id), eq(entries.documentId, id)))
      .orderBy(desc(entries.sequence));
    expect(taken).toMatchObject({ occurredOn: "2026-05-01", kind: "cost" });
    expect(taken?.reversesId).not.toBeNull();
    expect(await desk.month("2026-03")).toMatchObject({ netMinor: -4200 });
    expect(await desk.month("2026-05")).toMatchObject({ netMinor: 4200 });
    expect((await booksOf(outfit.id)).accounts).toEqual({});
  });

  it("opens again for the owner only, and that stays on record", async () => {
    await desk.close("2026-03");
    expect((await desk.reopen("2026-03", "bookkeeper")).status).toBe(403);
    const opened = await desk.reopen("2026-03");
    expect(opened.body).toMatchObject({ month: "2026-03", closedAt: null, closedBy: null });
    expect(opened.body.reopenedAt).not.toBeNull();
    await desk.cost("2026-03-10", 5);
    expect((await desk.close("2026-03")).status).toBe(200);
    const actions = await database()
      .select({ action: auditLog.action, subject: auditLog.subjectId })
      .from(auditLog)
      .where(eq(auditLog.outfitId, outfit.id))
      .orderBy(auditLog.id);
    expect(actions.filter((row) => row.action !== "add-cost")).toEqual(
      ["close-month", "reopen-month", "close-month"].map((action) => ({ action, subject: "2026-03" })),
    );
  });
});

describe("closing", () => {
  it("waits until the month has ended", async () => {
    const month = monthOf(dateIn("America/New_York", now()));
    for (const early of [month, shiftMonth(month, 1)]) {
      const refused = await desk.close(early);
      expect([refused.status, refused.problem.detail.includes("has not ended")]).toEqual([409, true]);
    }
    expect((await desk.close(shiftMonth(month, -1))).status).toBe(200);
  });

  it("happens once, also when two do it at the same moment", async () => {
    const answers = await Promise.all([desk.close("2026-03", "owner"), desk.close("2026-03", "bookkeeper")]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect((await desk.reopen("2026-02")).status).toBe(409);
  });

  it("is not for those who do not see the books, and says which month it cannot read", async () => {
    for (const role of ["collector", "sorter"] as const) expect((await desk.close("2026-03", role)).status).toBe(403);
    for (const month of ["2026-13", "March", newId(), ""]) {
      const refused = await desk.close(month);
      expect([refused.status, refused.problem.errors?.[0]?.path], month).toEqual([422, "month"]);
    }
    const other = deskOf(await makeOutfit());
    await other.close("2026-03");
    await desk.cost("2026-03-10", 5);
  });
});
