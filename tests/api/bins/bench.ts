import { and, eq } from "drizzle-orm";
import { expect } from "vitest";
import * as oneBin from "@/app/api/o/[outfit]/bins/[id]/route";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as countVoid from "@/app/api/o/[outfit]/counts/[id]/void/route";
import * as counts from "@/app/api/o/[outfit]/counts/route";
import * as closing from "@/app/api/o/[outfit]/months/[month]/close/route";
import * as pickupVoid from "@/app/api/o/[outfit]/pickups/[id]/void/route";
import * as workOut from "@/app/api/o/[outfit]/pickups/[id]/work-out/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as weighInVoid from "@/app/api/o/[outfit]/weigh-ins/[id]/void/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import { database } from "@/db/client";
import { movementLines, movements } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import type { Role } from "@/lib/auth/permissions";
import type { Bin, Count, WeighIn } from "@/lib/bins/schema";
import type { RouteHandler } from "@/lib/http/route";
import { newId } from "@/lib/ids";
import { call, type Answer } from "../call";
import type { TestOutfit } from "../outfit";

export const DAY = "2026-01-15";

type Body = Record<string, unknown>;
type More = { role?: Role; headers?: Record<string, string> };

/** The work at the bench scale, each step through the API. */
export function benchOf(outfit: TestOutfit) {
  const send = <T>(handler: RouteHandler, params: Record<string, string>, body: unknown, { role = "owner", headers = {} }: More = {}) =>
    call<T>(handler, outfit, { key: outfit.keys[role], params, body, headers });
  const made = <T>(answer: Answer<T>, status = 201): T => {
    expect(answer.status, JSON.stringify(answer.body)).toBe(status);
    return answer.body;
  };
  const tryWeighIn = (body: Body, more: More = {}) => send<WeighIn>(weighIns.POST, {}, { weighedOn: DAY, ...body }, more);
  const tryCount = (body: Body, more: More = {}) => send<Count>(counts.POST, {}, { countedOn: DAY, ...body }, more);
  return {
    tryBin: (body: Body, more: More = {}) => send<Bin>(bins.POST, {}, body, more),
    bin: async (grade: string, body: Body = {}) => made(await send<Bin>(bins.POST, {}, { label: newId().slice(-8), gradeId: outfit.grade(grade), ...body })).id,
    seeBin: (id: string, role: Role = "owner") => call<Bin>(oneBin.GET, outfit, { key: outfit.keys[role], params: { id } }),
    seeBins: (query: Record<string, string> = {}, role: Role = "owner") =>
      call<{ items: Bin[]; nextCursor: null }>(bins.GET, outfit, { key: outfit.keys[role], query }),
    change: (id: string, version: number, body: Body, role: Role = "owner") =>
      call<Bin>(oneBin.PATCH, outfit, { key: outfit.keys[role], params: { id }, method: "PATCH", body, headers: { "if-match": `"${version}"` } }),
    /** A haul of that estimated weight; its id. */
    haul: async (weight: string, paidMinor: number, body: Body = {}) => {
      const items = [{ itemKindId: outfit.kind("printer"), count: 1, weight }];
      return made(await send<{ id: string }>(pickups.POST, {}, { pickedUpOn: DAY, source: "bought", items, paidMinor, ...body })).id;
    },
    voidHaul: async (id: string) => made(await send<{ id: string }>(pickupVoid.POST, { id }, {}), 200),
    workOut: async (id: string) => made(await send<{ id: string }>(workOut.POST, { id }, {}), 200),
    closeMonth: async (month: string) => made(await send<{ month: string }>(closing.POST, { month }, {}), 200),
    tryWeighIn,
    weigh: async (binId: string, net: string, body: Body = {}, more: More = {}) => made(await tryWeighIn({ binId, gross: net, tare: "0", ...body }, more)),
    voidWeighIn: (id: string, more: More = {}) => send<WeighIn>(weighInVoid.POST, { id }, {}, more),
    seeWeighIns: (query: Record<string, string> = {}, role: Role = "owner") =>
      call<{ items: WeighIn[]; nextCursor: string | null }>(weighIns.GET, outfit, { key: outfit.keys[role], query }),
    tryCount,
    count: async (binId: string, gross: string, body: Body = {}, more: More = {}) => made(await tryCount({ binId, gross, tare: "0", ...body }, more)),
    voidCount: (id: string, more: More = {}) => send<Count>(countVoid.POST, { id }, {}, more),
    seeCounts: (query: Record<string, string> = {}, role: Role = "owner") =>
      call<{ items: Count[]; nextCursor: string | null }>(counts.GET, outfit, { key: outfit.keys[role], query }),
  };
}

/** The weight book's lines of one document: place and quantity, with the lot's pickup where there is one, as first booked. */
export async function linesOf(outfitId: string, documentId: string): Promise<string[]> {
  const rows = await database()
    .select({ place: movementLines.place, pickupId: movementLines.pickupId, quantity: movementLines.quantity, on: movementLines.occurredOn })
    .from(movements)
    .innerJoin(movementLines, and(eq(movementLines.outfitId, movements.outfitId), eq(movementLines.movementId, movements.id)))
    .where(and(eq(movements.outfitId, outfitId), eq(movements.documentId, documentId)))
    .orderBy(movements.sequence, movementLines.line);
  return rows.map((row) => [row.on, row.place, row.pickupId ?? "", trim(row.quantity)].filter((part) => part !== "").join(" "));
}

/** Expects a refusal that names the field. */
export function expectFieldError(answer: Answer<unknown>, path: string, words = ""): void {
  expect(answer.status, JSON.stringify(answer.body)).toBe(422);
  const error = (answer.problem.errors ?? []).find((one) => one.path === path);
  expect(error, JSON.stringify(answer.body)).toBeDefined();
  expect(error?.message).toContain(words);
}
