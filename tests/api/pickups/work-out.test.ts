import { afterEach, beforeEach, describe, expect, it } from "vitest";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as counts from "@/app/api/o/[outfit]/counts/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as onePickup from "@/app/api/o/[outfit]/pickups/[id]/route";
import * as voiding from "@/app/api/o/[outfit]/pickups/[id]/void/route";
import * as workOut from "@/app/api/o/[outfit]/pickups/[id]/work-out/route";
import * as sheets from "@/app/api/o/[outfit]/price-sheets/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as weighInVoid from "@/app/api/o/[outfit]/weigh-ins/[id]/void/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import type { Role } from "@/lib/auth/permissions";
import type { RouteHandler } from "@/lib/http/route";
import { newId } from "@/lib/ids";
import type { PickupRecord } from "@/lib/pickups/schema";
import { call } from "../call";
import { makeOutfit, type TestOutfit } from "../outfit";
import { booksOf, expectTrueBooks, lotOf } from "./books-of";

const DAY = "2026-01-15";

let outfit: TestOutfit;

beforeEach(async () => {
  outfit = await makeOutfit();
});

afterEach(async () => {
  await expectTrueBooks(outfit.id);
});

async function make(handler: RouteHandler, body: unknown, role: Role = "owner"): Promise<string> {
  const made = await call<{ id: string }>(handler, outfit, { key: outfit.keys[role], body });
  expect(made.status, JSON.stringify(made.body)).toBe(201);
  return made.body.id;
}

const act = (handler: RouteHandler, id: string, role: Role = "owner", headers: Record<string, string> = {}) =>
  call<PickupRecord>(handler, outfit, { key: outfit.keys[role], params: { id }, body: {}, headers });

/** Three microwaves, 108.06 lb by estimate. */
const haul = (paidMinor: number, role: Role = "collector") =>
  make(pickups.POST, { pickedUpOn: DAY, source: "bought", items: [{ itemKindId: outfit.kind("microwave-oven"), count: 3 }], paidMinor }, role);

const bin = (grade: string) => make(bins.POST, { label: newId().slice(-8), gradeId: outfit.grade(grade), tare: "2" });
const weigh = (binId: string, net: string, more: Record<string, unknown>) => make(weighIns.POST, { binId, gross: net, tare: "0", weighedOn: DAY, ...more });

async function sheet(lines: Record<string, string>): Promise<void> {
  const yardId = await make(yards.POST, { name: "Northgate Metals" });
  await make(sheets.POST, {
    yardId,
    inForceFrom: "2026-01-02",
    lines: Object.entries(lines).map(([grade, price]) => ({ gradeId: outfit.grade(grade), price, per: "lb" })),
  });
}

describe("working a haul out", () => {
  it("takes the rest of the estimate off the pile and splits the rest of the cost by what the goods would bring", async () => {
    await sheet({ "no2-copper": "4", shred: "0.1" });
    const [copper, shred] = [await bin("no2-copper"), await bin("shred")];
    const id = await haul(10_806);
    await weigh(copper, "10", { pickupId: id });
    await weigh(shred, "50", { pickupId: id });
    // Each pound of the estimate costs a dollar: 60 of 108.06 are drawn.
    expect(await lotOf(outfit.id, id)).toEqual({ weight: "48.06", costMinor: 4806 });
    const answer = await act(workOut.POST, id, "sorter");
    expect(answer.status, JSON.stringify(answer.body)).toBe(200);
    expect(answer.body).toMatchObject({ state: "worked-out", remainingWeight: "0", version: 2 });
    // 10 lb at $4 against 50 lb at 10 cents: 40 to 5, so 42.72 and 5.34 of the 48.06 that were left.
    expect(await booksOf(outfit.id)).toEqual({
      accounts: { cash: -10_806, "scrap-stock": 10_806 },
      lots: [],
      stock: {
        [outfit.grade("no2-copper")]: { quantity: "10", costMinor: 1000 + 4272 },
        [outfit.grade("shred")]: { quantity: "50", costMinor: 5000 + 534 },
      },
    });
  });

  it("splits by weight while no yard has a price", async () => {
    const [copper, shred] = [await bin("no2-copper"), await bin("shred")];
    const id = await haul(10_806);
    await weigh(copper, "10", { pickupId: id });
    await weigh(shred, "30", { pickupId: id });
    await act(workOut.POST, id);
    // 6806 is left: a quarter and three quarters, the odd half cent to the earlier part.
    const { stock } = await booksOf(outfit.id);
    const costs = [stock[outfit.grade("no2-copper")]?.costMinor, stock[outfit.grade("shred")]?.costMinor];
    expect(costs).toEqual([1000 + 1702, 3000 + 5104]);
  });

  it("counts what was drawn from its share of the pile among its goods", async () => {
    const copper = await bin("no2-copper");
    const id = await haul(10_806);
    await weigh(copper, "20", { fromPile: true });
    await act(workOut.POST, id);
    expect((await booksOf(outfit.id)).stock).toEqual({ [outfit.grade("no2-copper")]: { quantity: "20", costMinor: 10_806 } });
  });

  it("charges the share of goods that are gone to the cost of scrap sold", async () => {
    const copper = await bin("no2-copper");
    const id = await haul(10_806);
    await weigh(copper, "10", { pickupId: id });
    await make(counts.POST, { binId: copper, gross: "0", tare: "0", countedOn: DAY });
    await act(workOut.POST, id);
    const { accounts, stock } = await booksOf(outfit.id);
    expect(accounts).toEqual({ cash: -10_806, "stock-loss": 1000, "cost-of-scrap-sold": 9806 });
    expect(stock).toEqual({});
  });

  it("is a loss when nothing was made of it, and books nothing in the money book when it cost nothing", async () => {
    await act(workOut.POST, await haul(900));
    await act(workOut.POST, await haul(0));
    expect(await booksOf(outfit.id)).toEqual({ accounts: { cash: -900, "stock-loss": 900 }, lots: [], stock: {} });
  });

  it("happens once: the same request again gets the first answer, another is refused", async () => {
    const id = await haul(900);
    const headers = { "idempotency-key": newId() };
    const first = await act(workOut.POST, id, "owner", headers);
    const again = await act(workOut.POST, id, "owner", headers);
    expect(again.body).toEqual(first.body);
    expect(again.headers.get("idempotency-replayed")).toBe("true");
    expect((await act(workOut.POST, id)).status).toBe(409);
  });

  it("is for those who weigh; another outfit's haul does not exist", async () => {
    const id = await haul(0);
    expect((await act(workOut.POST, id, "bookkeeper")).status).toBe(403);
    const other = await makeOutfit();
    expect((await call(workOut.POST, other, { key: other.keys.owner, params: { id }, body: {} })).status).toBe(404);
    expect((await act(workOut.POST, id, "collector")).status).toBe(200);
  });
});

describe("a weigh-in of a worked-out haul that is taken back", () => {
  it("opens the haul again with all of its weight and cost, so that the right grade can have it", async () => {
    const [wrong, right] = [await bin("shred"), await bin("no2-copper")];
    const id = await haul(10_806);
    const mistaken = await weigh(wrong, "10", { pickupId: id });
    await act(workOut.POST, id);
    expect((await act(weighInVoid.POST, mistaken)).status).toBe(200);
    expect((await call<PickupRecord>(onePickup.GET, outfit, { key: outfit.keys.owner, params: { id } })).body).toMatchObject({
      state: "open",
      remainingWeight: "108.06",
    });
    expect(await booksOf(outfit.id)).toEqual({
      accounts: { cash: -10_806, "scrap-stock": 10_806 },
      lots: [{ pickupId: id, weight: "108.06", costMinor: 10_806 }],
      stock: {},
    });
    await weigh(right, "10", { pickupId: id });
    await act(workOut.POST, id);
    expect((await booksOf(outfit.id)).stock).toEqual({ [outfit.grade("no2-copper")]: { quantity: "10", costMinor: 10_806 } });
  });
});

describe("taking a haul back", () => {
  it("leaves both books as they were", async () => {
    await haul(400, "owner");
    const before = await booksOf(outfit.id);
    const id = await haul(2500);
    const answer = await act(voiding.POST, id);
    expect(answer.status, JSON.stringify(answer.body)).toBe(200);
    expect(answer.body).toMatchObject({ state: "void", remainingWeight: "0", version: 2 });
    expect(answer.body.voidedAt).not.toBeNull();
    expect(await booksOf(outfit.id)).toEqual(before);
  });

  it("waits until its weigh-ins are void, then leaves both books as they were, also after it was worked out", async () => {
    const copper = await bin("no2-copper");
    const id = await haul(2500);
    const weighIn = await weigh(copper, "10", { pickupId: id });
    await act(workOut.POST, id);
    const refused = await act(voiding.POST, id);
    expect(refused.status).toBe(409);
    expect(refused.problem.detail).toContain("Void its weigh-ins first");
    await act(weighInVoid.POST, weighIn);
    await act(workOut.POST, id);
    expect((await act(voiding.POST, id)).status).toBe(200);
    expect(await booksOf(outfit.id)).toEqual({ accounts: {}, lots: [], stock: {} });
  });

  it("waits as well for weigh-ins that drew from its share of the pile", async () => {
    const copper = await bin("no2-copper");
    const id = await haul(0);
    const weighIn = await weigh(copper, "10", { fromPile: true });
    expect((await act(voiding.POST, id)).status).toBe(409);
    await act(weighInVoid.POST, weighIn);
    expect((await act(voiding.POST, id)).status).toBe(200);
  });

  it("is done once: the same request again gets the first answer, another is refused", async () => {
    const id = await haul(100);
    const headers = { "idempotency-key": newId() };
    const first = await act(voiding.POST, id, "owner", headers);
    expect((await act(voiding.POST, id, "owner", headers)).body).toEqual(first.body);
    expect((await act(voiding.POST, id)).status).toBe(409);
    expect((await act(workOut.POST, id)).status).toBe(409);
  });

  it("is for the owner, and for a collector on hauls of their own until they are worked", async () => {
    const own = await haul(0);
    const others = await haul(0, "owner");
    const worked = await haul(0);
    await act(workOut.POST, worked);
    for (const role of ["bookkeeper", "sorter"] as const) expect((await act(voiding.POST, own, role)).status).toBe(403);
    expect((await act(voiding.POST, others, "collector")).status).toBe(403);
    expect((await act(voiding.POST, worked, "collector")).status).toBe(403);
    expect((await act(voiding.POST, own, "collector")).status).toBe(200);
    const other = await makeOutfit();
    expect((await call(voiding.POST, other, { key: other.keys.owner, params: { id: others }, body: {} })).status).toBe(404);
    expect((await act(voiding.POST, worked)).status).toBe(200);
  });
});
