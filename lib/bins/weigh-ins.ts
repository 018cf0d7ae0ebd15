import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { pickups, weighIns } from "@/db/schema";
import { compare, sum, trim } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { openBooks, type Books } from "@/lib/books/books";
import { reverseDocument } from "@/lib/books/reverse";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { newId } from "@/lib/ids";
import { reopenPickup } from "@/lib/pickups/service";
import { getWeighIn, listWeighIns, openLots, pickupsDrawnBy } from "./queries";
import { requireBinInUse } from "./in-use";
import { drawProblems, fitsTheBook, weighed, weighInBooking, type Lot, type TypedDraw } from "./rules";
import type { WeighIn, WeighInInput, WeighInListQuery } from "./schema";

/** A page of weigh-ins, newest first. */
export const seeWeighIns = (ctx: Context, query: WeighInListQuery) => listWeighIns(database(), { outfitId: ctx.outfit.id, ...query });

/** One weigh-in. Throws `not-found`. */
export const seeWeighIn = (ctx: Context, id: string): Promise<WeighIn> => requireWeighIn(database(), ctx, id);

async function requireWeighIn(db: Parameters<typeof getWeighIn>[0], ctx: Context, id: string): Promise<WeighIn> {
  const found = await getWeighIn(db, { outfitId: ctx.outfit.id, id });
  if (!found) throw notFound("weigh-in");
  return found;
}

/** The draws as typed. Throws `input` for sums that disagree with them, and for draws that put nothing in. */
function requireDraws(input: WeighInInput): TypedDraw[] {
  const several = input.draws !== undefined;
  const draws = input.draws ?? [{ gross: input.gross ?? "0", tare: input.tare ?? "0" }];
  for (const side of ["gross", "tare"] as const) {
    const said = input[side];
    if (several && said !== undefined && compare(said, sum(draws.map((draw) => draw[side]))) !== 0) {
      throw fieldError(side, `The draws make ${trim(sum(draws.map((draw) => draw[side])))}, not ${trim(said)}. Leave it out, or correct a draw.`);
    }
  }
  const errors = drawProblems(draws, several);
  if (errors.length > 0) throw new AppError("input", errors[0]?.message ?? "", { errors });
  return draws;
}

/** The lots that the net is drawn from, or null for metal from outside. */
async function lotsFor(books: Books, input: WeighInInput): Promise<Lot[] | null> {
  const { id: outfitId } = books.ctx.outfit;
  if (input.fromPile) return openLots(books.tx, { outfitId });
  if (input.pickupId === undefined) return null;
  const [pickup] = await books.tx
    .select({ number: pickups.number, state: pickups.state })
    .from(pickups)
    .where(and(eq(pickups.outfitId, outfitId), eq(pickups.id, input.pickupId)));
  if (!pickup) throw fieldError("pickupId", "There is no such pickup here.");
  if (pickup.state !== "open")
    throw new AppError("conflict", `Pickup ${pickup.number} is ${pickup.state === "void" ? "void" : "worked out"}. Weigh it in from the pile or from outside.`);
  const lot = (await books.lots([input.pickupId])).get(input.pickupId);
  return [{ pickupId: input.pickupId, remainingWeight: lot?.remainingWeight ?? "0", remainingCostMinor: lot?.remainingCostMinor ?? 0 }];
}

/**
 * Puts weighed metal into a bin. Throws `input` for draws that put nothing in or too much, or a day that lies ahead, `conflict` for a bin put away or a pickup
 * that is not open, `books-refuse` for a closed month.
 */
export async function weighIn(ctx: Context, input: WeighInInput): Promise<WeighIn> {
  if (input.weighedOn > ctx.today) throw fieldError("weighedOn", "Date must be today or earlier.");
  const draws = requireDraws(input);
  const unit = input.unit ?? ctx.outfit.weightUnit;
  const { gross, tare, net } = weighed(draws, unit, ctx.outfit.weightUnit);
  if (!fitsTheBook(gross)) {
    throw fieldError(input.draws === undefined ? "gross" : "draws", `Gross must be less than ten million ${ctx.outfit.weightUnit}. Look at the unit.`);
  }
  if (compare(net, "0") <= 0) throw fieldError("gross", "That is too little to weigh in this unit.");
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const bin = await requireBinInUse(books, input.binId);
    const lots = await lotsFor(books, input);
    const id = input.id ?? newId();
    await tx.insert(weighIns).values({
      outfitId: ctx.outfit.id,
      id,
      binId: bin.id,
      gradeId: bin.gradeId,
      weighedOn: input.weighedOn,
      pickupId: input.pickupId ?? null,
      fromPile: input.fromPile,
      gross,
      tare,
      net,
      draws,
      unit,
      note: input.note ?? null,
      madeBy: ctx.actor.memberId,
      madeAt: ctx.now,
    });
    const sides = weighInBooking({ binId: bin.id, gradeId: bin.gradeId, net, lots });
    await books.post({ kind: "weigh-in", on: input.weighedOn, document: { type: "weigh-in", id }, ...sides });
    await audit(tx, ctx, "weigh-in", { type: "weigh-in", id });
    return requireWeighIn(tx, ctx, id);
  });
}

/** Takes a weigh-in back out of both books. Throws `forbidden` for somebody else's, `conflict` when it is void already, `books-refuse` when the bin holds less. */
export async function voidWeighIn(ctx: Context, id: string): Promise<WeighIn> {
  return transact(ctx, async (tx) => {
    const books = await openBooks(tx, ctx);
    const found = await requireWeighIn(tx, ctx, id);
    if (ctx.actor.role !== "owner" && found.madeBy.id !== ctx.actor.memberId) {
      throw new AppError("forbidden", `${found.madeBy.name} weighed this in. Only they or the owner take it back.`);
    }
    if (found.voidedAt !== null) throw new AppError("conflict", "This weigh-in is void already.");
    await tx
      .update(weighIns)
      .set({ voidedAt: ctx.now, voidedBy: ctx.actor.memberId })
      .where(and(eq(weighIns.outfitId, ctx.outfit.id), eq(weighIns.id, id)));
    // What it drew goes back onto the pile, so hauls that were marked worked out since are open again.
    for (const pickupId of await pickupsDrawnBy(tx, { outfitId: ctx.outfit.id, weighInId: id })) await reopenPickup(books, pickupId);
    await reverseDocument(books, { type: "weigh-in", id });
    await audit(tx, ctx, "void-weigh-in", { type: "weigh-in", id });
    return requireWeighIn(tx, ctx, id);
  });
}
