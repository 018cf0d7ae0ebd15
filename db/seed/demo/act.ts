import { eq } from "drizzle-orm";
import { database } from "@/db/client";
import { binBalances } from "@/db/schema";
import { lineAmount } from "@/lib/arithmetic/price";
import type { Role } from "@/lib/auth/permissions";
import { addBin, countBin, weighIn } from "@/lib/bins/service";
import { addDays, shiftMonth } from "@/lib/clock";
import { addCost, closeMonth } from "@/lib/money/service";
import { logPickup, workOutPickup } from "@/lib/pickups/service";
import { pricesInForce } from "@/lib/prices/queries";
import { addSheet, addYard } from "@/lib/prices/service";
import { ticketInputSchema } from "@/lib/tickets/schema";
import { draftTicket, payTicket, postTicket } from "@/lib/tickets/service";
import { GRADES, YARDS } from "./figures";
import type { Happening } from "./history";
import { hundredths, toHundredths } from "./random";
import { contextOn, type Stage } from "./stage";

type Keys = { gradeIds: Map<string, string>; kindIds: Map<string, string> };
type Sale = Extract<Happening, { what: "sale" }>;
type Due = { on: string; ticketId: string; amountMinor: number; method: "cash" | "check" };

function need<K, V>(map: Map<K, V>, key: K): V {
  const value = map.get(key);
  if (value === undefined) throw new Error(`the demo knows no ${String(key)}`);
  return value;
}

/** Acts out what happened: every booking goes through the use case that the API calls, by the member whose job it is. */
export class Teller {
  private readonly yards: string[] = [];
  private readonly bins = new Map<string, { id: string; grade: string }>();
  private readonly pickups = new Map<number, string>();
  private readonly due: Due[] = [];

  constructor(
    private readonly stage: Stage,
    private readonly keys: Keys,
  ) {}

  private as(role: Role, on: string) {
    return contextOn(this.stage, role, on);
  }

  /** The yards and the empty bins that the outfit starts with. */
  async setUp(): Promise<void> {
    const owner = this.as("owner", this.stage.today);
    for (const { name, place, phone, hours, note } of YARDS) this.yards.push((await addYard(owner, { name, place, phone, hours, note })).id);
    for (const grade of GRADES) {
      const sellPoint = String(Math.ceil(grade.sellPoint / grade.bins.length));
      for (const label of grade.bins) {
        const bin = await addBin(owner, { label, gradeId: need(this.keys.gradeIds, grade.key), tare: hundredths(grade.tare), place: "shop floor", sellPoint });
        this.bins.set(label, { id: bin.id, grade: grade.key });
      }
    }
  }

  async tell(on: string, happening: Happening): Promise<void> {
    switch (happening.what) {
      case "sheet":
        return this.sheet(on, happening);
      case "pickup":
        return this.pickup(on, happening);
      case "weigh-in":
        await weighIn(this.as("sorter", on), {
          binId: need(this.bins, happening.bin).id,
          gross: happening.gross,
          tare: happening.tare,
          pickupId: need(this.pickups, happening.pickup),
          weighedOn: on,
          fromPile: false,
        });
        return;
      case "work-out":
        await workOutPickup(this.as("owner", on), need(this.pickups, happening.pickup));
        return;
      case "count":
        return this.count(on, happening.bin, happening.lossHundredths);
      case "sale":
        return this.sale(on, happening);
      case "cost":
        await addCost(this.as("bookkeeper", on), {
          spentOn: on,
          kind: happening.kind,
          amountMinor: happening.amountMinor,
          paidFrom: happening.kind === "other" ? "bank" : "card",
          note: happening.note,
        });
    }
  }

  private async sheet(on: string, { yard, lines }: Extract<Happening, { what: "sheet" }>): Promise<void> {
    const wording = new Map<string, string>(GRADES.map((grade) => [grade.key, grade.wording]));
    await addSheet(this.as("bookkeeper", on), {
      yardId: this.yards[yard] ?? "",
      inForceFrom: on,
      lines: lines.map(({ grade, price }) => ({ gradeId: need(this.keys.gradeIds, grade), price, per: "lb" as const, yardWording: need(wording, grade) })),
    });
  }

  private async pickup(on: string, { ref, source, place, paidMinor, items }: Extract<Happening, { what: "pickup" }>): Promise<void> {
    const made = await logPickup(this.as("collector", on), {
      pickedUpOn: on,
      source,
      place,
      paidMinor,
      paidFrom: "cash",
      items: items.map(({ kind, count }) => ({ itemKindId: need(this.keys.kindIds, kind), count })),
    });
    this.pickups.set(ref, made.id);
  }

  private async held(binId: string): Promise<number> {
    const [row] = await database().select({ quantity: binBalances.quantity }).from(binBalances).where(eq(binBalances.binId, binId));
    return row ? toHundredths(row.quantity) : 0;
  }

  private async count(on: string, label: string, loss: number): Promise<void> {
    const { id } = need(this.bins, label);
    const held = await this.held(id);
    if (held <= loss) return;
    await countBin(this.as("sorter", on), { binId: id, gross: hundredths(held - loss), tare: "0", countedOn: on, note: "Monthly count" });
  }

  /** Sells the ripe grades to the yard at its own prices: the bin is emptied to within what the yard's scale loses. */
  private async sale(on: string, { yard, number, grades, payAfter, short }: Sale): Promise<void> {
    const yardId = this.yards[yard] ?? "";
    const prices = (await pricesInForce(database(), { outfitId: this.stage.outfit.id, on })).filter((price) => price.yardId === yardId);
    const lines = [];
    for (const [label, bin] of this.bins) {
      const price = prices.find((one) => one.gradeId === this.keys.gradeIds.get(bin.grade));
      const held = await this.held(bin.id);
      if (!grades.includes(bin.grade) || !price || held < 200) continue;
      // Now and then a yard's scale reads the first line a little light.
      const light: number = short && lines.length === 0 ? Math.trunc(held / 60) : 0;
      const net = Math.trunc((held - light) / 20) * 20;
      const amountMinor = lineAmount({ quantity: hundredths(net), unit: "lb", price: price.price, per: price.per, exponent: 2 });
      const tare = need(new Map<string, number>(GRADES.map((grade) => [grade.key, grade.tare])), bin.grade);
      const step = Math.trunc(tare / 20) * 20;
      lines.push({
        gradeId: price.gradeId,
        binId: bin.id,
        gross: hundredths(net + step),
        tare: hundredths(step),
        net: hundredths(net),
        price: price.price,
        per: price.per,
        amountMinor,
        yardWording: price.yardWording ?? label,
      });
    }
    if (lines.length === 0) return;
    await this.enter(on, { yardId, number, lines, payAfter });
    // The truck took all of it, so what the book still has is what the two scales differ by.
    for (const { binId } of lines) {
      if ((await this.held(binId)) > 0) await countBin(this.as("sorter", on), { binId, gross: "0", tare: "0", countedOn: on, note: "Empty after the run" });
    }
  }

  private async enter(on: string, paper: { yardId: string; number: string; lines: { amountMinor: number }[]; payAfter: number | null }): Promise<void> {
    const totalMinor = paper.lines.reduce((total, line) => total + line.amountMinor, 0);
    const method = totalMinor < 15_000 ? "cash" : "check";
    const input = ticketInputSchema.parse({ yardId: paper.yardId, number: paper.number, ticketOn: on, lines: paper.lines, totalMinor, paymentMethod: method });
    const draft = await draftTicket(this.as("collector", on), input);
    const office = this.as("bookkeeper", on);
    await postTicket(office, draft.id);
    if (paper.payAfter !== null && totalMinor > 0) this.due.push({ on: addDays(on, paper.payAfter), ticketId: draft.id, amountMinor: totalMinor, method });
  }

  /** What the office does at the end of a day: payments that came in, and on the tenth the close of the month before the last. */
  async endOf(on: string): Promise<void> {
    for (const due of this.due.filter((one) => one.on === on)) {
      await payTicket(this.as("bookkeeper", on), due.ticketId, { paidOn: on, amountMinor: due.amountMinor, method: due.method });
    }
    const month = shiftMonth(on.slice(0, 7), -1);
    const firstMonth = shiftMonth(this.stage.today.slice(0, 7), -13);
    if (on.endsWith("-10") && month >= firstMonth && month < shiftMonth(this.stage.today.slice(0, 7), -1)) await closeMonth(this.as("bookkeeper", on), month);
  }
}
