import "server-only";
import { and, eq, inArray, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { itemKinds, movementLines, movements, pickupItems, pickups, weighIns } from "@/db/schema";
import type { Transaction } from "@/db/transaction";
import { isZero, sum, type DecimalString } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { openBooks, type Books } from "@/lib/books/books";
import { reverseDocument } from "@/lib/books/reverse";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { isId, newId } from "@/lib/ids";
import { bestPrices } from "@/lib/prices/queries";
import { getPickup, listPickups, outputsOf } from "./queries";
import { lineEstimate, pickupBooking, whyNotVoid, workOutBooking } from "./rules";
import type { PickupInput, PickupListQuery, PickupRecord } from "./schema";

/** A page of the outfit's pickups, newest first, with the money that this member sees. */
export const seePickups = (ctx: Context, query: PickupListQuery) => listPickups(database(), { outfitId: ctx.outfit.id, viewer: ctx, ...query });

/** One pickup with all that belongs to it. Throws `not-found`. */
export const seePickup = (ctx: Context, id: string): Promise<PickupRecord> => requirePickup(database(), ctx, id);

async function requirePickup(db: Parameters<typeof getPickup>[0], ctx: Context, id: string): Promise<PickupRecord> {
  const pickup = await getPickup(db, { outfitId: ctx.outfit.id, id, viewer: ctx });
  if (!pickup) throw notFound("pickup");
  return pickup;
}

type Line = PickupInput["items"][number] & { estimate: DecimalString };

/** The lines with what each puts on the pile. Throws `input` that names the line of a kind that is not here. */
async function estimated(tx: Transaction, ctx: Context, items: PickupInput["items"]): Promise<Line[]> {
  const kinds = await tx
    .select({ id: itemKinds.id, typicalWeight: itemKinds.typicalWeight })
    .from(itemKinds)
    .where(
      and(
        eq(itemKinds.outfitId, ctx.outfit.id),
        inArray(
          itemKinds.id,
          items.map((item) => item.itemKindId),
        ),
      ),
    );
  const typical = new Map(kinds.map((kind) => [kind.id, kind.typicalWeight]));
  const unknown = items.flatMap((item, index) =>
    typical.has(item.itemKindId) ? [] : [{ path: `items.${index}.itemKindId`, message: "There is no such item kind here." }],
  );
  if (unknown.length > 0) throw new AppError("input", "There is no such item kind here.", { errors: unknown });
  return items.map((item) => ({
    ...item,
    estimate: lineEstimate({
      count: item.count,
      typicalWeight: typical.get(item.itemKindId) ?? "0",
      ...(item.weight === undefined ? {} : { weighed: item.weight }),
    }),
  }));
}

async function insertPickup(books: Books, id: string, input: PickupInput, lines: Line[]): Promise<void> {
  const { tx, ctx } = books;
  await tx.insert(pickups).values({
    outfitId: ctx.outfit.id,
    id,
    number: await books.takePickupNumber(),
    pickedUpOn: input.pickedUpOn,
    source: input.source,
    place: input.place ?? null,
    note: input.note ?? null,
    paidMinor: input.paidMinor,
    paidFrom: input.paidFrom,
    estimatedWeight: sum(lines.map((line) => line.estimate)),
    madeBy: ctx.actor.memberId,
    madeAt: ctx.now,
  });
  await tx.insert(pickupItems).values(
    lines.map((line, index) => ({
      outfitId: ctx.outfit.id,
      pickupId: id,
      line: index + 1,
      itemKindId: line.itemKindId,
      count: line.count,
      weighed: line.weight ?? null,
      estimatedWeight: line.estimate,
    })),
  );
}

/**
 * Logs a haul: its estimate comes onto the pile, what was paid becomes the cost of its lot. Throws `input` for a day that lies ahead or an item
 * kind that is not here, `books-refuse` for a day in a closed month.
 */
export async function logPickup(ctx: Context, input: PickupInput): Promise<PickupRecord> {
  if (input.pickedUpOn > ctx.today) throw fieldError("pickedUpOn", "Date must be today or earlier.");
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const lines = await estimated(tx, ctx, input.items);
    const id = input.id ?? newId();
    await insertPickup(books, id, input, lines);
    const sides = pickupBooking({
      pickupId: id,
      estimates: lines.map((line) => line.estimate),
      paidMinor: input.paidMinor,
      paidFrom: input.paidFrom,
      memberId: ctx.actor.memberId,
    });
    await books.post({ kind: "pickup", on: input.pickedUpOn, document: { type: "pickup", id }, ...sides });
    await audit(tx, ctx, "log-pickup", { type: "pickup", id });
    return requirePickup(tx, ctx, id);
  });
}

type Standing = { state: "open" | "worked-out" | "void"; madeBy: string; version: number };

/** The pickup as it stands under the outfit's lock. */
async function standing(tx: Transaction, ctx: Context, id: string): Promise<Standing> {
  if (!isId(id)) throw notFound("pickup");
  const [row] = await tx
    .select({ state: pickups.state, madeBy: pickups.madeBy, version: pickups.version })
    .from(pickups)
    .where(and(eq(pickups.outfitId, ctx.outfit.id), eq(pickups.id, id)));
  if (!row) throw notFound("pickup");
  return row;
}

async function setState(tx: Transaction, ctx: Context, id: string, pickup: Standing, change: Partial<typeof pickups.$inferInsert>): Promise<void> {
  await tx
    .update(pickups)
    .set({ ...change, version: pickup.version + 1 })
    .where(and(eq(pickups.outfitId, ctx.outfit.id), eq(pickups.id, id)));
}

/** Whether any weigh-in stands that names this pickup or drew from its share of the pile. */
async function wasWeighed(tx: Transaction, ctx: Context, pickupId: string): Promise<boolean> {
  const [drawn] = await tx
    .select({ total: sql<string>`coalesce(sum(${movementLines.quantity}), 0)` })
    .from(movementLines)
    .innerJoin(movements, and(eq(movements.outfitId, movementLines.outfitId), eq(movements.id, movementLines.movementId)))
    .where(
      and(
        eq(movementLines.outfitId, ctx.outfit.id),
        eq(movementLines.pickupId, pickupId),
        eq(movementLines.place, "pile"),
        eq(movements.documentType, "weigh-in"),
      ),
    );
  if (!isZero(drawn?.total ?? "0")) return true;
  const [named] = await tx
    .select({ id: weighIns.id })
    .from(weighIns)
    .where(and(eq(weighIns.outfitId, ctx.outfit.id), eq(weighIns.pickupId, pickupId), sql`${weighIns.voidedAt} is null`))
    .limit(1);
  return named !== undefined;
}

/**
 * Takes a haul back out of both books. Throws `not-found`, `forbidden` (a collector: another's haul, or one that is worked out), `conflict` when
 * it is void already, `books-refuse` while weigh-ins from it stand.
 */
export async function voidPickup(ctx: Context, id: string): Promise<PickupRecord> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const pickup = await standing(tx, ctx, id);
    const refusal = whyNotVoid({ id: ctx.actor.memberId, role: ctx.actor.role }, pickup);
    if (refusal) throw new AppError("forbidden", refusal);
    if (pickup.state === "void") throw new AppError("conflict", "This haul is void already.");
    if (await wasWeighed(tx, ctx, id)) throw new AppError("books-refuse", "Metal was weighed in from this haul. Void its weigh-ins first.");
    await reverseDocument(books, { type: "pickup", id });
    await setState(tx, ctx, id, pickup, { state: "void", voidedAt: ctx.now });
    await audit(tx, ctx, "void-pickup", { type: "pickup", id });
    return requirePickup(tx, ctx, id);
  });
}

/** What was made of the haul, with today's best prices and what is still held of each grade. */
async function pricedOutputs(books: Books, pickupId: string) {
  const { tx, ctx } = books;
  const outputs = await outputsOf(tx, { outfitId: ctx.outfit.id, pickupId });
  const prices = await bestPrices(tx, { outfitId: ctx.outfit.id, on: ctx.today });
  const stock = await books.stock(outputs.map((output) => output.gradeId));
  return outputs.map((output) => ({
    ...output,
    price: prices.get(output.gradeId)?.normalised ?? null,
    held: stock.get(output.gradeId)?.quantity ?? "0",
  }));
}

/**
 * Marks a haul worked out, dated today: what is left of its estimate goes to variance, what is left of its cost to the goods made of it. Throws
 * `not-found`, or `conflict` when it is worked out or void already.
 */
export async function workOutPickup(ctx: Context, id: string): Promise<PickupRecord> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const pickup = await standing(tx, ctx, id);
    if (pickup.state !== "open") throw new AppError("conflict", pickup.state === "void" ? "This haul is void." : "This haul is worked out already.");
    const lot = (await books.lots([id])).get(id) ?? { remainingWeight: "0", remainingCostMinor: 0 };
    const sides = workOutBooking({ pickupId: id, ...lot, outputs: lot.remainingCostMinor === 0 ? [] : await pricedOutputs(books, id) });
    if (!isZero(lot.remainingWeight) || lot.remainingCostMinor !== 0) {
      await books.post({ kind: "work-out", on: ctx.today, document: { type: "pickup", id }, ...sides });
    }
    await setState(tx, ctx, id, pickup, { state: "worked-out" });
    await audit(tx, ctx, "work-out-pickup", { type: "pickup", id });
    return requirePickup(tx, ctx, id);
  });
}

/**
 * Opens a worked-out haul again, because a weigh-in from it is being taken back: what working it out wrote off comes back onto the pile first, so
 * that the next weigh-in draws from it. Does nothing to a haul that is open or void. Part of the caller's booking.
 */
export async function reopenPickup(books: Books, pickupId: string): Promise<void> {
  const { tx, ctx } = books;
  const pickup = await standing(tx, ctx, pickupId);
  if (pickup.state !== "worked-out") return;
  await reverseDocument(books, { type: "pickup", id: pickupId }, { kind: "work-out" });
  await setState(tx, ctx, pickupId, pickup, { state: "open" });
  await audit(tx, ctx, "reopen-pickup", { type: "pickup", id: pickupId });
}
