import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import * as bins from "@/app/api/o/[outfit]/bins/route";
import * as counts from "@/app/api/o/[outfit]/counts/route";
import * as countVoid from "@/app/api/o/[outfit]/counts/[id]/void/route";
import * as pickups from "@/app/api/o/[outfit]/pickups/route";
import * as pickupVoid from "@/app/api/o/[outfit]/pickups/[id]/void/route";
import * as workOut from "@/app/api/o/[outfit]/pickups/[id]/work-out/route";
import * as tickets from "@/app/api/o/[outfit]/tickets/route";
import * as payments from "@/app/api/o/[outfit]/tickets/[id]/payments/route";
import * as ticketPost from "@/app/api/o/[outfit]/tickets/[id]/post/route";
import * as ticketVoid from "@/app/api/o/[outfit]/tickets/[id]/void/route";
import * as weighIns from "@/app/api/o/[outfit]/weigh-ins/route";
import * as weighInVoid from "@/app/api/o/[outfit]/weigh-ins/[id]/void/route";
import * as yards from "@/app/api/o/[outfit]/yards/route";
import { database } from "@/db/client";
import { add, fixed, subtract, sum } from "@/lib/arithmetic/decimal";
import { lineAmount } from "@/lib/arithmetic/price";
import { checkBooks } from "@/lib/books/always-true";
import type { RouteHandler } from "@/lib/http/route";
import { newId } from "@/lib/ids";
import { call, type Answer } from "../api/call";
import { makeOutfit, type TestOutfit } from "../api/outfit";

const TODAY = new Date().toISOString().slice(0, 10);
const DAY = "2026-01-15";

/** One thing a member does. `pick` chooses among what exists by then; `again` sends the very same request once more. */
type Step = {
  act: "pickup" | "weigh" | "count" | "sell" | "pay" | "void-weigh-in" | "void-count" | "void-ticket" | "void-pickup" | "work-out";
  pick: number;
  tenths: number;
  money: number;
  again: boolean;
};

const step: fc.Arbitrary<Step> = fc.record({
  act: fc.constantFrom<Step["act"]>(
    "pickup",
    "weigh",
    "weigh",
    "weigh",
    "count",
    "sell",
    "sell",
    "pay",
    "void-weigh-in",
    "void-count",
    "void-ticket",
    "void-pickup",
    "work-out",
  ),
  pick: fc.nat(1000),
  tenths: fc.integer({ min: 1, max: 900 }),
  money: fc.integer({ min: 0, max: 9000 }),
  again: fc.boolean(),
});

type Known = { id: string; binId: string; quantity: string };

/** What the answers of the API said so far: the model that the books are held against. */
class Model {
  pickups: string[] = [];
  weighIns: Known[] = [];
  counts: Known[] = [];
  tickets: (Known & { totalMinor: number })[] = [];
}

const tenths = (count: number) => `${Math.trunc(count / 10)}.${count % 10}`;

class Run {
  readonly model = new Model();
  private serial = 0;

  constructor(
    readonly outfit: TestOutfit,
    readonly binIds: string[],
    readonly gradeIds: string[],
    readonly yardId: string,
  ) {}

  private async send<T>(handler: RouteHandler, again: boolean, body: unknown, id?: string): Promise<Answer<T>> {
    const input = { key: this.outfit.keys.owner, body, headers: { "idempotency-key": newId() }, ...(id === undefined ? {} : { params: { id } }) };
    // The repeat runs at the same time as the first, so that the two also race each other.
    const [first, repeat] = await Promise.all([call<T>(handler, this.outfit, input), again ? call<T>(handler, this.outfit, input) : null]);
    for (const answer of [first, repeat]) expect(answer?.status ?? 200, JSON.stringify(answer?.body)).toBeLessThan(500);
    if (!repeat) return first;
    // A refusal keeps no answer, so either of the two may be refused and the other, finding the books changed, be let in.
    const taken = first.status < 300 ? first : repeat;
    if (taken.status < 300) {
      const later = await call<T>(handler, this.outfit, input);
      expect(later.headers.get("idempotency-replayed")).toBe("true");
      for (const answer of [first, repeat, later]) if (answer.status < 300) expect(answer.body).toEqual(taken.body);
    }
    return taken;
  }

  private choose<T>(list: T[], pick: number): T | undefined {
    return list.length === 0 ? undefined : list[pick % list.length];
  }

  async take({ act, pick, tenths: weight, money, again }: Step): Promise<void> {
    const binIndex = pick % this.binIds.length;
    const binId = this.binIds[binIndex] ?? "";
    const gradeId = this.gradeIds[binIndex] ?? "";
    const { model } = this;
    if (act === "pickup") {
      const items = [{ itemKindId: this.outfit.kind("microwave-oven"), count: 1 + (pick % 3) }];
      const answer = await this.send<{ id: string }>(pickups.POST, again, { pickedUpOn: DAY, source: "bought", items, paidMinor: money });
      if (answer.status === 201) model.pickups.push(answer.body.id);
    } else if (act === "weigh") {
      const pickupId = pick % 2 === 0 ? this.choose(model.pickups, pick) : undefined;
      const from = pickupId === undefined ? (pick % 3 === 0 ? { fromPile: true } : {}) : { pickupId };
      const answer = await this.send<{ id: string; net: string }>(weighIns.POST, again, {
        binId,
        gross: tenths(weight + 20),
        tare: "2.0",
        weighedOn: DAY,
        ...from,
      });
      if (answer.status === 201) model.weighIns.push({ id: answer.body.id, binId, quantity: answer.body.net });
    } else if (act === "count") {
      const answer = await this.send<{ id: string; difference: string }>(counts.POST, again, { binId, gross: tenths(weight), tare: "0", countedOn: DAY });
      if (answer.status === 201) model.counts.push({ id: answer.body.id, binId, quantity: answer.body.difference });
    } else if (act === "sell") await this.sell(binId, gradeId, weight, money, again);
    else if (act === "pay") {
      const ticket = this.choose(model.tickets, pick);
      if (ticket) await this.send(payments.POST, again, { paidOn: DAY, amountMinor: 1 + (money % Math.max(1, ticket.totalMinor)), method: "check" }, ticket.id);
    } else if (act === "void-weigh-in") await this.takeBack(weighInVoid.POST, model.weighIns, pick, again);
    else if (act === "void-count") await this.takeBack(countVoid.POST, model.counts, pick, again);
    else if (act === "void-ticket") await this.takeBack(ticketVoid.POST, model.tickets, pick, again);
    else {
      const pickupId = this.choose(model.pickups, pick);
      if (pickupId) await this.send(act === "void-pickup" ? pickupVoid.POST : workOut.POST, again, {}, pickupId);
    }
  }

  private async sell(binId: string, gradeId: string, weight: number, money: number, again: boolean): Promise<void> {
    const price = tenths(money % 40);
    const net = tenths(weight);
    const amountMinor = lineAmount({ quantity: net, unit: "lb", price, per: "lb", exponent: 2 });
    this.serial += 1;
    const body = {
      yardId: this.yardId,
      number: `P-${this.serial}-${newId().slice(-6)}`,
      ticketOn: DAY,
      lines: [{ gradeId, binId, net, price, per: "lb", amountMinor }],
      totalMinor: amountMinor,
    };
    const draft = await this.send<{ id: string }>(tickets.POST, again, body);
    expect(draft.status, JSON.stringify(draft.body)).toBe(201);
    const posted = await this.send(ticketPost.POST, again, {}, draft.body.id);
    if (posted.status < 300) this.model.tickets.push({ id: draft.body.id, binId, quantity: net, totalMinor: amountMinor });
  }

  private async takeBack(handler: RouteHandler, list: Known[], pick: number, again: boolean): Promise<void> {
    const known = this.choose(list, pick);
    if (!known) return;
    const answer = await this.send(handler, again, {}, known.id);
    if (answer.status < 300) list.splice(list.indexOf(known), 1);
  }

  async expectTrue(): Promise<void> {
    const rules = await checkBooks(database(), { outfitId: this.outfit.id });
    expect(rules.filter((rule) => !rule.holds)).toEqual([]);
    const answer = await call<{ items: { id: string; balance: string }[] }>(bins.GET, this.outfit, { key: this.outfit.keys.owner, query: { limit: "200" } });
    for (const binId of this.binIds) {
      const of = (list: Known[]) => sum(list.filter((known) => known.binId === binId).map((known) => known.quantity));
      const expected = subtract(add(of(this.model.weighIns), of(this.model.counts)), of(this.model.tickets));
      expect(fixed(answer.body.items.find((bin) => bin.id === binId)?.balance ?? "", 4)).toBe(fixed(expected, 4));
    }
  }
}

async function makeRun(): Promise<Run> {
  const outfit = await makeOutfit();
  const gradeIds = [outfit.grade("no2-copper"), outfit.grade("no2-copper"), outfit.grade("shred")];
  const binIds: string[] = [];
  for (const [index, gradeId] of gradeIds.entries()) {
    const made = await call<{ id: string }>(bins.POST, outfit, { key: outfit.keys.owner, body: { label: `B-${index}`, gradeId, tare: "2" } });
    expect(made.status, JSON.stringify(made.body)).toBe(201);
    binIds.push(made.body.id);
  }
  const yard = await call<{ id: string }>(yards.POST, outfit, { key: outfit.keys.owner, body: { name: "Northgate Metals" } });
  expect(yard.status, JSON.stringify(yard.body)).toBe(201);
  return new Run(outfit, binIds, gradeIds, yard.body.id);
}

describe("whatever the members do", () => {
  let seed = 0;
  beforeAll(() => {
    // A seed of the day: every day tries something new, and a failure names the seed that brings it back.
    seed = Number.parseInt(TODAY.replaceAll("-", ""), 10);
  });

  it("A-21: both books are true and every bin holds what the answers said, one thing after another", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 8, maxLength: 30 }), async (steps) => {
        const run = await makeRun();
        for (const one of steps) await run.take(one);
        await run.expectTrue();
      }),
      { numRuns: 12, seed, endOnFailure: true },
    );
  });

  it("A-15: both books are true and nothing is booked twice when members act at once", async () => {
    await fc.assert(
      fc.asyncProperty(fc.array(fc.array(step, { minLength: 2, maxLength: 5 }), { minLength: 3, maxLength: 7 }), async (rounds) => {
        const run = await makeRun();
        for (const round of rounds) await Promise.all(round.map((one) => run.take(one)));
        await run.expectTrue();
      }),
      { numRuns: 10, seed, endOnFailure: true },
    );
  });
});
