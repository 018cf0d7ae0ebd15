import { and, count, eq } from "drizzle-orm";
import { beforeAll, describe, expect, it } from "vitest";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as costs from "@/app/api/o/[outfit]/costs/route";
import * as counts from "@/app/api/o/[outfit]/counts/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as sheets from "@/app/api/o/[outfit]/price-sheets/route";
import * as tickets from "@/app/api/o/[outfit]/tickets/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import { database } from "@/db/client";
import { auditLog, entries, movements } from "@/db/schema";
import { checkBooks } from "@/lib/books/always-true";
import type { RouteHandler } from "@/lib/http/route";
import { newId } from "@/lib/ids";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";

const DAY = "2026-01-15";

/** Words go into these as they are, within their length; everything else has a form. */
const WORDS = /(^|\.)(place|note|name|label|number|yardWording|phone|hours)$/;

const NEVER: unknown[] = [
  "",
  "-1",
  -1,
  "NaN",
  Number.MAX_SAFE_INTEGER + 2,
  "Infinity",
  "1e5",
  "0x10",
  1.23456,
  "1.23456",
  "9".repeat(40),
  "١٢",
  "12,5",
  true,
  null,
  [],
  {},
  "x".repeat(300_000),
  "🪙",
  "2026-02-30",
  "9999-01-01",
  "1899-12-31",
  "'; drop table grades; --",
];

/** A price may have up to six decimals, so the five of the list above are fine in one. */
const isFine = (path: string, value: unknown) => path.endsWith("price") && value === "1.23456";

type Json = Record<string, unknown>;
type Case = { name: string; handler: RouteHandler; body: () => Json };

let outfit: TestOutfit;
let foreign: TestOutfit;
let binId = "";
let yardId = "";
let foreignBin = "";
let foreignYard = "";

const make = async (handler: RouteHandler, of: TestOutfit, body: Json): Promise<string> => {
  const made = await call<{ id: string }>(handler, of, { key: of.keys.owner, body });
  expect(made.status, JSON.stringify(made.body)).toBe(201);
  return made.body.id;
};

beforeAll(async () => {
  outfit = await makeOutfit();
  foreign = await makeOutfit();
  binId = await make(bins.POST, outfit, { label: "C2-1", gradeId: outfit.grade("no2-copper"), tare: "2" });
  foreignBin = await make(bins.POST, foreign, { label: "C2-1", gradeId: foreign.grade("no2-copper"), tare: "2" });
  yardId = await make(yards.POST, outfit, { name: "Northgate Metals" });
  foreignYard = await make(yards.POST, foreign, { name: "Northgate Metals" });
});

const CASES: Case[] = [
  {
    name: "pickups",
    handler: pickups.POST,
    body: () => ({
      pickedUpOn: DAY,
      source: "curb",
      place: "Alder Row",
      items: [{ itemKindId: outfit.kind("printer"), count: 2, weight: "31.5" }],
      paidMinor: 500,
      note: "two",
    }),
  },
  {
    name: "bins",
    handler: bins.POST,
    body: () => ({ label: `L-${newId().slice(-8)}`, gradeId: outfit.grade("shred"), tare: "4.5", place: "by the door", sellPoint: "300" }),
  },
  { name: "weigh-ins", handler: weighIns.POST, body: () => ({ binId, gross: "14.25", tare: "1.85", unit: "lb", weighedOn: DAY, note: "clean" }) },
  { name: "counts", handler: counts.POST, body: () => ({ binId, gross: "12.4", tare: "1.85", countedOn: DAY, note: "monthly" }) },
  { name: "yards", handler: yards.POST, body: () => ({ name: `Yard ${newId()}`, place: "Lock Basin", note: "asks for ID" }) },
  {
    name: "price-sheets",
    handler: sheets.POST,
    body: () => ({
      yardId,
      inForceFrom: "2026-01-02",
      lastDay: "2026-01-20",
      lines: [{ gradeId: outfit.grade("no2-copper"), price: "3.96", per: "lb", yardWording: "#2 COPPER" }],
    }),
  },
  {
    name: "tickets",
    handler: tickets.POST,
    body: () => ({
      yardId,
      number: `T-${newId().slice(-10)}`,
      ticketOn: DAY,
      lines: [
        {
          gradeId: outfit.grade("no2-copper"),
          binId,
          gross: "62.4",
          tare: "3.6",
          deduction: "0",
          net: "58.8",
          price: "3.96",
          per: "lb",
          amountMinor: 23285,
          yardWording: "#2 COPPER",
        },
      ],
      taxMinor: 0,
      feeMinor: 0,
      totalMinor: 23285,
      paymentMethod: "check",
    }),
  },
  { name: "costs", handler: costs.POST, body: () => ({ spentOn: DAY, kind: "fuel", amountMinor: 4200, paidFrom: "cash", note: "truck" }) },
];

/** Every leaf of a body: its path and how to put another value there. */
function leaves(value: unknown, path: string[] = []): string[][] {
  if (value !== null && typeof value === "object") return Object.entries(value).flatMap(([key, inner]) => leaves(inner, [...path, key]));
  return [path];
}

function withValue(body: Json, path: string[], value: unknown): Json {
  const copy = structuredClone(body);
  let at: Json = copy;
  for (const key of path.slice(0, -1)) at = at[key] as Json;
  at[path.at(-1) ?? ""] = value;
  return copy;
}

async function booked(outfitId: string): Promise<number[]> {
  const db = database();
  const [movementCount] = await db.select({ n: count() }).from(movements).where(eq(movements.outfitId, outfitId));
  const [entryCount] = await db.select({ n: count() }).from(entries).where(eq(entries.outfitId, outfitId));
  const [auditCount] = await db
    .select({ n: count() })
    .from(auditLog)
    .where(and(eq(auditLog.outfitId, outfitId)));
  return [movementCount?.n ?? 0, entryCount?.n ?? 0, auditCount?.n ?? 0];
}

describe.each(CASES)("POST /$name", ({ handler, body }) => {
  it("takes the good request that the bad ones are made from", async () => {
    const answer = await call(handler, outfit, { key: outfit.keys.owner, body: body() });
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
  });

  it("A-22: names each field that is wrong and books nothing", async () => {
    const paths = leaves(body()).filter((path) => !WORDS.test(path.join(".")));
    for (const path of paths) {
      const at = path.join(".");
      const good = path.reduce<unknown>((inner, key) => (inner as Json)[key], body());
      for (const value of NEVER) {
        if (value === good || isFine(at, value)) continue;
        const before = await booked(outfit.id);
        const answer = await call(handler, outfit, { key: outfit.keys.owner, body: withValue(body(), path, value) });
        const told = `${at} = ${JSON.stringify(value)?.slice(0, 40)}: ${answer.status} ${JSON.stringify(answer.body).slice(0, 300)}`;
        expect([409, 422], told).toContain(answer.status);
        expect(
          (answer.problem.errors ?? []).some((error) => error.path.startsWith(at) || at.startsWith(error.path)),
          told,
        ).toBe(true);
        expect(await booked(outfit.id), told).toEqual(before);
      }
    }
  });

  it("keeps names in any script as they were typed, and refuses those that are too long or broken", async () => {
    for (const path of leaves(body()).filter((one) => WORDS.test(one.join(".")))) {
      for (const value of [`🧲 ${newId().slice(-6)}`, `شارع ${newId().slice(-6)}`, "x".repeat(300_000), "a\u0000b", "\u0007", 7, {}, []]) {
        const answer = await call(handler, outfit, { key: outfit.keys.owner, body: withValue(body(), path, value) });
        const told = `${path.join(".")} = ${JSON.stringify(value)?.slice(0, 40)}: ${answer.status} ${JSON.stringify(answer.body).slice(0, 200)}`;
        // A sheet for the same yard and day stands already: the words were read well and the booking is refused for that.
        expect(typeof value === "string" && value.length < 100 && !/[\u0000-\u001f]/.test(value) ? [201, 409] : [422], told).toContain(answer.status);
      }
    }
  });

  it("A-4: another outfit's things do not exist", async () => {
    const theirs: Record<string, string> = {
      binId: foreignBin,
      yardId: foreignYard,
      gradeId: foreign.grade("no2-copper"),
      itemKindId: foreign.kind("printer"),
    };
    for (const path of leaves(body())) {
      const value = theirs[path.at(-1) ?? ""];
      if (value === undefined) continue;
      const before = await booked(outfit.id);
      const answer = await call(handler, outfit, { key: outfit.keys.owner, body: withValue(body(), path, value) });
      expect([404, 422], `${path.join(".")}: ${answer.status} ${JSON.stringify(answer.body)}`).toContain(answer.status);
      expect(await booked(outfit.id)).toEqual(before);
    }
  });
});

it("after all of it both books are true", async () => {
  for (const { id } of [outfit, foreign]) expect((await checkBooks(database(), { outfitId: id })).filter((rule) => !rule.holds)).toEqual([]);
});
