import { expect } from "vitest";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as costs from "@/app/api/o/[outfit]/costs/route";
import * as costVoid from "@/app/api/o/[outfit]/costs/[id]/void/route";
import * as earnings from "@/app/api/o/[outfit]/earnings/route";
import * as closing from "@/app/api/o/[outfit]/months/[month]/close/route";
import * as reopening from "@/app/api/o/[outfit]/months/[month]/reopen/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as tickets from "@/app/api/o/[outfit]/tickets/route";
import * as posting from "@/app/api/o/[outfit]/tickets/[id]/post/route";
import * as ticketVoid from "@/app/api/o/[outfit]/tickets/[id]/void/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import type { Role } from "@/lib/auth/permissions";
import type { RouteHandler } from "@/lib/http/route";
import { newId } from "@/lib/ids";
import type { Cost, Earnings, Month } from "@/lib/money/schema";
import { call } from "../call";
import type { TestOutfit } from "../outfit";

/** The work that moves a month's figures, each step through the API. */
export function deskOf(outfit: TestOutfit) {
  const send = <T>(handler: RouteHandler, params: Record<string, string>, body: unknown, role: Role = "owner") =>
    call<T>(handler, outfit, { key: outfit.keys[role], params, body });
  const make = async (handler: RouteHandler, body: unknown, role: Role = "owner"): Promise<string> => {
    const made = await send<{ id: string }>(handler, {}, body, role);
    expect(made.status, JSON.stringify(made.body)).toBe(201);
    return made.body.id;
  };
  const act = async (handler: RouteHandler, params: Record<string, string>): Promise<void> => {
    const done = await send(handler, params, {});
    expect(done.status, JSON.stringify(done.body)).toBe(200);
  };
  return {
    bin: (grade: string) => make(bins.POST, { label: newId().slice(-8), gradeId: outfit.grade(grade), tare: "2" }),
    yard: (name: string) => make(yards.POST, { name }),
    haul: (on: string, paidMinor: number) =>
      make(pickups.POST, { pickedUpOn: on, source: "bought", items: [{ itemKindId: outfit.kind("printer"), count: 1, weight: "100" }], paidMinor }),
    weigh: (binId: string, net: string, on: string, more: Record<string, unknown> = {}) =>
      make(weighIns.POST, { binId, gross: net, tare: "0", weighedOn: on, ...more }),
    sell: async (yardId: string, on: string, line: { grade: string; binId: string; net: string; price: string; amountMinor: number }): Promise<string> => {
      const { grade, ...rest } = line;
      const id = await make(tickets.POST, {
        yardId,
        number: newId().slice(-12),
        ticketOn: on,
        lines: [{ ...rest, gradeId: outfit.grade(grade), per: "lb" }],
        totalMinor: line.amountMinor,
      });
      await act(posting.POST, { id });
      return id;
    },
    voidTicket: (id: string) => act(ticketVoid.POST, { id }),
    cost: (on: string, amountMinor: number, more: Record<string, unknown> = {}, role: Role = "owner") =>
      make(costs.POST, { spentOn: on, kind: "fuel", amountMinor, ...more }, role),
    tryCost: (body: Record<string, unknown>, role: Role = "owner") => send<Cost>(costs.POST, {}, body, role),
    voidCost: (id: string, role: Role = "owner") => send<Cost>(costVoid.POST, { id }, {}, role),
    costsOf: (role: Role, query: Record<string, string> = {}) =>
      call<{ items: Cost[]; nextCursor: string | null }>(costs.GET, outfit, { key: outfit.keys[role], query }),
    close: (month: string, role: Role = "owner") => send<Month>(closing.POST, { month }, {}, role),
    reopen: (month: string, role: Role = "owner") => send<Month>(reopening.POST, { month }, {}, role),
    month: async (month: string): Promise<Earnings> => {
      const answer = await call<Earnings>(earnings.GET, outfit, { key: outfit.keys.bookkeeper, query: { month } });
      expect(answer.status, JSON.stringify(answer.body)).toBe(200);
      return answer.body;
    },
  };
}
