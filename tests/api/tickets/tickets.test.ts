import { and, eq, sql } from "drizzle-orm";
import { beforeEach, describe, expect, it } from "vitest";
import extension from "../../vectors/extension.json" with { type: "json" };
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as tickets from "@/app/api/o/[outfit]/tickets/route";
import * as check from "@/app/api/o/[outfit]/tickets/[id]/check/route";
import * as payments from "@/app/api/o/[outfit]/tickets/[id]/payments/route";
import * as post from "@/app/api/o/[outfit]/tickets/[id]/post/route";
import * as ticket from "@/app/api/o/[outfit]/tickets/[id]/route";
import * as voids from "@/app/api/o/[outfit]/tickets/[id]/void/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as sheets from "@/app/api/o/[outfit]/price-sheets/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import { database } from "@/db/client";
import { accountBalances, binBalances, gradeStock, postings } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import { checkBooks } from "@/lib/books/always-true";
import type { Ticket, TicketCheck } from "@/lib/tickets/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

const DAY = "2026-01-15";

let outfit: TestOutfit;
let gradeId: string;
let binId: string;
let yardId: string;
let serial = 0;

async function make<T extends { id: string }>(handler: Parameters<typeof call>[0], body: unknown, key = outfit.keys.owner): Promise<T> {
  const made = await call<T>(handler, outfit, { key, body });
  expect(made.status, JSON.stringify(made.body)).toBe(201);
  return made.body;
}

type Line = Record<string, unknown>;

const line = (more: Line = {}): Line => ({ gradeId, binId, net: "40", price: "4.02", per: "lb", amountMinor: 16080, ...more });

function paper(more: Record<string, unknown> = {}): Record<string, unknown> {
  serial += 1;
  return { yardId, number: `N-${serial}`, ticketOn: DAY, lines: [line()], totalMinor: 16080, ...more };
}

const act = (handler: Parameters<typeof call>[0], id: string, body: unknown = {}, key = outfit.keys.owner) =>
  call<Ticket>(handler, outfit, { key, body, params: { id } });

async function balance(account: string): Promise<number> {
  const [row] = await database()
    .select({ balance: accountBalances.balanceMinor })
    .from(accountBalances)
    .where(and(eq(accountBalances.outfitId, outfit.id), eq(accountBalances.account, account)));
  return row?.balance ?? 0;
}

async function held(): Promise<string> {
  const [row] = await database()
    .select({ quantity: binBalances.quantity })
    .from(binBalances)
    .where(and(eq(binBalances.outfitId, outfit.id), eq(binBalances.binId, binId)));
  return trim(row?.quantity ?? "0");
}

const stock = async () =>
  (await database().select().from(gradeStock).where(eq(gradeStock.outfitId, outfit.id))).map((row) => [trim(row.quantity), row.costMinor]);

async function expectTrue(): Promise<void> {
  expect((await checkBooks(database(), { outfitId: outfit.id })).filter((rule) => !rule.holds)).toEqual([]);
}

// A hundred pounds of No. 2 copper that cost $30.00, in one bin.
beforeEach(async () => {
  outfit = await makeOutfit();
  gradeId = outfit.grade("no2-copper");
  binId = (await make(bins.POST, { label: "C2-1", gradeId, tare: "2" })).id;
  yardId = (await make(yards.POST, { name: "Northgate Metals" })).id;
  const haul = await make(pickups.POST, {
    pickedUpOn: DAY,
    source: "bought",
    items: [{ itemKindId: outfit.kind("printer"), count: 1, weight: "100" }],
    paidMinor: 3000,
  });
  await make(weighIns.POST, { binId, gross: "102", tare: "2", weighedOn: DAY, pickupId: haul.id });
});

describe("a posted ticket", () => {
  it("moves the metal out of its bin and books sale, claim and cost at the moving average", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    expect(await held()).toBe("100");
    const posted = await act(post.POST, draft.id);
    expect([posted.status, posted.body.state, posted.body.leftMinor]).toEqual([200, "posted", 16080]);
    expect(await held()).toBe("60");
    expect([await balance("owed-by-yards"), await balance("scrap-sales"), await balance("cost-of-scrap-sold"), await balance("scrap-stock")]).toEqual([
      16080, -16080, 1200, 1800,
    ]);
    await expectTrue();
  });

  it("takes tax on top and fees off, each to its account", async () => {
    const draft = await make<Ticket>(tickets.POST, paper({ taxMinor: 100, feeMinor: 250, totalMinor: 15930 }));
    await act(post.POST, draft.id);
    expect([await balance("owed-by-yards"), await balance("sales-tax"), await balance("yard-fees")]).toEqual([15930, -100, 250]);
    await expectTrue();
  });

  it("that sells more than the bin holds is refused with how much is missing, and books nothing", async () => {
    const draft = await make<Ticket>(tickets.POST, paper({ lines: [line({ net: "104.5", amountMinor: 42009 })], totalMinor: 42009 }));
    const refused = await act(post.POST, draft.id);
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toContain("4.5 lb less");
    expect(await held()).toBe("100");
    expect(await balance("owed-by-yards")).toBe(0);
  });

  it("with no bin named draws from the grade's bins, fullest first", async () => {
    const second = (await make(bins.POST, { label: "C2-2", gradeId })).id;
    await make(weighIns.POST, { binId: second, gross: "30", tare: "0", weighedOn: DAY });
    const draft = await make<Ticket>(tickets.POST, paper({ lines: [line({ binId: undefined, net: "110", amountMinor: 44220 })], totalMinor: 44220 }));
    expect((await act(post.POST, draft.id)).status).toBe(200);
    expect(await held()).toBe("0");
    expect(await stock()).toEqual([["20", 462]]);
    await expectTrue();
  });

  it("A-14: posted by two at once is booked once", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    const answers = await Promise.all([act(post.POST, draft.id), act(post.POST, draft.id, {}, outfit.keys.bookkeeper)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(await held()).toBe("60");
    await expectTrue();
  });

  it("voided, with its payments, leaves both books as they were", async () => {
    const before = [await held(), await stock(), await balance("bank"), await balance("scrap-stock")];
    const draft = await make<Ticket>(tickets.POST, paper());
    await act(post.POST, draft.id);
    await act(payments.POST, draft.id, { paidOn: DAY, amountMinor: 6080, method: "check" });
    const voided = await act(voids.POST, draft.id);
    expect([voided.status, voided.body.state, voided.body.paidMinor]).toEqual([200, "void", 0]);
    expect([await held(), await stock(), await balance("bank"), await balance("scrap-stock")]).toEqual(before);
    expect([await balance("owed-by-yards"), await balance("scrap-sales"), await balance("cost-of-scrap-sold")]).toEqual([0, 0, 0]);
    expect((await act(voids.POST, draft.id)).status).toBe(409);
    await expectTrue();
  });
});

describe("a payment", () => {
  it("in parts lowers the claim until the ticket is paid; more than is owed is refused", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    expect((await act(payments.POST, draft.id, { paidOn: DAY, amountMinor: 1, method: "cash" })).status).toBe(409);
    await act(post.POST, draft.id);
    const first = await act(payments.POST, draft.id, { paidOn: DAY, amountMinor: 6000, method: "cash" });
    expect([first.status, first.body.state, first.body.leftMinor]).toEqual([201, "posted", 10080]);
    const over = await act(payments.POST, draft.id, { paidOn: DAY, amountMinor: 10081, method: "check" });
    expect([over.status, over.problem.errors?.[0]?.path]).toEqual([409, "amountMinor"]);
    const rest = await act(payments.POST, draft.id, { paidOn: DAY, amountMinor: 10080, method: "check" });
    expect(rest.body.state).toBe("paid");
    // The haul was paid for in cash, so cash starts at -3000.
    expect([await balance("cash"), await balance("bank"), await balance("owed-by-yards")]).toEqual([3000, 10080, 0]);
    await expectTrue();
  });

  it("sent twice with one key is booked once", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    await act(post.POST, draft.id);
    const input = {
      key: outfit.keys.owner,
      params: { id: draft.id },
      body: { paidOn: DAY, amountMinor: 100, method: "cash" },
      headers: { "idempotency-key": "pay-once" },
    };
    const answers = [await call<Ticket>(payments.POST, outfit, input), await call<Ticket>(payments.POST, outfit, input)];
    expect(answers.map((answer) => [answer.status, answer.body.paidMinor])).toEqual([
      [201, 100],
      [201, 100],
    ]);
    const other = await call(payments.POST, outfit, { ...input, body: { ...input.body, amountMinor: 101 } });
    expect(other.status).toBe(422);
  });
});

describe("the sums of a paper", () => {
  it.each(extension.cases.filter((one) => one.exponent === 2 && !one.quantity.includes("e")).map((one) => [one.quantity, one.price, one.amountMinor] as const))(
    "%s lb at %s is an amount of %i, rounded half away from zero, once",
    async (quantity, price, amountMinor) => {
      const body = paper({ lines: [line({ net: quantity, price, amountMinor })], totalMinor: amountMinor });
      expect((await call(tickets.POST, outfit, { key: outfit.keys.owner, body })).status).toBe(201);
      const wrong = paper({ lines: [line({ net: quantity, price, amountMinor: amountMinor + 1 })], totalMinor: amountMinor + 1 });
      expect((await call(tickets.POST, outfit, { key: outfit.keys.owner, body: wrong })).status).toBe(422);
    },
  );

  // Measurement Canada, laboratory manual part 2 section 8.0: recorded values must be mathematically correct; its failing example is
  // gross 45 010, tare 20 000, net 25 000.
  it("gross 45010, tare 20000 and net 25000 do not add up (Measurement Canada, lab manual part 2, 8.0)", async () => {
    const refused = await call(tickets.POST, outfit, {
      key: outfit.keys.owner,
      body: paper({ lines: [line({ gross: "45010", tare: "20000", net: "25000", price: "0.01", amountMinor: 25000 })], totalMinor: 25000 }),
    });
    expect(refused.status).toBe(422);
    expect(refused.problem.errors?.map((error) => error.path)).toEqual(["lines.0.net"]);
    expect(refused.problem.errors?.[0]?.message).toContain("25010");
  });

  it("that are wrong are kept only when the person says that the paper has them so, and then the books follow the paper", async () => {
    const wrong = { lines: [line({ amountMinor: 16000 })], totalMinor: 15990 };
    const refused = await call(tickets.POST, outfit, { key: outfit.keys.owner, body: paper(wrong) });
    expect([refused.status, refused.problem.errors?.map((error) => error.path)]).toEqual([422, ["lines.0.amountMinor", "totalMinor"]]);
    const kept = await make<Ticket>(tickets.POST, paper({ ...wrong, paperSaysSo: true }));
    await act(post.POST, kept.id);
    expect([await balance("owed-by-yards"), await balance("scrap-sales"), await balance("rounding")]).toEqual([15990, -16000, 10]);
    const checked = await call<TicketCheck>(check.GET, outfit, { key: outfit.keys.owner, params: { id: kept.id } });
    expect(checked.body.sums.map((sum) => sum.path)).toEqual(["lines.0.amountMinor", "totalMinor"]);
    await expectTrue();
  });

  it("tare over gross is never kept, whatever the paper says", async () => {
    const body = paper({ lines: [line({ gross: "5", tare: "9" })], paperSaysSo: true });
    const refused = await call(tickets.POST, outfit, { key: outfit.keys.owner, body });
    expect([refused.status, refused.problem.errors?.[0]?.path]).toEqual([422, "lines.0.tare"]);
  });

  it("a price per long ton is extended exactly", async () => {
    // 2240 lb is one long ton: NIST Handbook 44, Appendix C.
    const body = paper({ lines: [line({ net: "2240", price: "250", per: "long-ton", amountMinor: 25000 })], totalMinor: 25000 });
    expect((await call(tickets.POST, outfit, { key: outfit.keys.owner, body })).status).toBe(201);
  });
});

describe("a paper", () => {
  it("is entered once a yard, and can be entered again after a void", async () => {
    const first = await make<Ticket>(tickets.POST, paper({ number: "20418" }));
    const again = await call(tickets.POST, outfit, { key: outfit.keys.owner, body: paper({ number: "20418" }) });
    expect([again.status, again.problem.errors?.[0]?.path]).toEqual([409, "number"]);
    await act(voids.POST, first.id);
    await make(tickets.POST, paper({ number: "20418" }));
  });

  it("changed by two is refused for the second, who gets it as it is now", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    const change = (version: number, number: string) =>
      call<Ticket>(ticket.PATCH, outfit, {
        method: "PATCH",
        key: outfit.keys.owner,
        params: { id: draft.id },
        body: paper({ number }),
        headers: { "if-match": `"${version}"` },
      });
    expect((await change(1, "first")).status).toBe(200);
    const late = await change(1, "second");
    expect(late.status).toBe(412);
    expect((late.problem.current as Ticket).number).toBe("first");
  });

  it("is seen by a sorter without money", async () => {
    const draft = await make<Ticket>(tickets.POST, paper());
    const seen = await call<Ticket>(ticket.GET, outfit, { key: outfit.keys.sorter, params: { id: draft.id } });
    expect([seen.body.totalMinor, seen.body.lines[0]?.price, seen.body.lines[0]?.amountMinor]).toEqual([null, null, null]);
    expect(JSON.stringify(seen.body)).not.toContain("16080");
  });

  it("is held against the yard's sheet in force on its date", async () => {
    await make(sheets.POST, { yardId, inForceFrom: "2026-01-10", lines: [{ gradeId, price: "4.10", per: "lb" }] });
    const draft = await make<Ticket>(tickets.POST, paper());
    const checked = await call<TicketCheck>(check.GET, outfit, { key: outfit.keys.collector, params: { id: draft.id } });
    expect(checked.body.lines).toMatchObject([{ sheetPrice: "4.1", sheetFrom: "2026-01-10", differenceMinor: -320 }]);
    expect(checked.body.underSheetMinor).toBe(-320);
  });

  it("that lies ahead, or names a bin of another grade, is refused", async () => {
    const ahead = await call(tickets.POST, outfit, { key: outfit.keys.owner, body: paper({ ticketOn: "2099-01-01" }) });
    expect([ahead.status, ahead.problem.errors?.[0]?.path]).toEqual([422, "ticketOn"]);
    const body = paper({ lines: [line({ gradeId: outfit.grade("shred") })] });
    const other = await call(tickets.POST, outfit, { key: outfit.keys.owner, body });
    expect([other.status, other.problem.errors?.[0]?.path]).toEqual([422, "lines.0.binId"]);
  });
});

it("every posting of a sale carries the yard and the ticket, so that reports can group by them", async () => {
  const draft = await make<Ticket>(tickets.POST, paper());
  await act(post.POST, draft.id);
  const [bare] = await database()
    .select({ n: sql<number>`count(*)`.mapWith(Number) })
    .from(postings)
    .where(and(eq(postings.outfitId, outfit.id), eq(postings.ticketId, draft.id), eq(postings.yardId, yardId)));
  expect(bare?.n).toBe(4);
});
