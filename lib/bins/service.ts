import "server-only";
import { and, eq } from "drizzle-orm";
import { database } from "@/db/client";
import { bins, grades } from "@/db/schema";
import { databaseErrorNumber, isDuplicateKey, type Transaction } from "@/db/transaction";
import { isZero } from "@/lib/arithmetic/decimal";
import type { Context } from "@/lib/auth/context";
import { openBooks } from "@/lib/books/books";
import { audit, transact } from "@/lib/books/transact";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { newId } from "@/lib/ids";
import { getBin, listBins } from "./queries";
import type { Bin, BinChange, BinInput, BinListQuery } from "./schema";

export { countBin, seeCount, seeCounts, voidCount } from "./counts";
export { seeWeighIn, seeWeighIns, voidWeighIn, weighIn } from "./weigh-ins";

/** The outfit's bins; the list is short and comes whole. */
export async function seeBins(ctx: Context, query: BinListQuery): Promise<{ items: Bin[]; nextCursor: null }> {
  return { items: await listBins(database(), { outfitId: ctx.outfit.id, all: query.all === "true", gradeId: query.gradeId }), nextCursor: null };
}

/** One bin. Throws `not-found`. */
export const seeBin = (ctx: Context, id: string): Promise<Bin> => requireBin(database(), ctx, id);

/** One bin as a transaction sees it. Throws `not-found`. */
export async function requireBin(db: Parameters<typeof getBin>[0], ctx: Context, id: string): Promise<Bin> {
  const bin = await getBin(db, { outfitId: ctx.outfit.id, id });
  if (!bin) throw notFound("bin");
  return bin;
}

function labelTaken(error: unknown, label: string): unknown {
  if (!isDuplicateKey(error)) return error;
  const message = `There is a bin ${label} already. Take another label.`;
  return new AppError("conflict", message, { errors: [{ path: "label", message }], cause: error });
}

async function requireGradeHere(tx: Transaction, ctx: Context, gradeId: string): Promise<void> {
  const [grade] = await tx
    .select({ id: grades.id })
    .from(grades)
    .where(and(eq(grades.outfitId, ctx.outfit.id), eq(grades.id, gradeId)));
  if (!grade) throw fieldError("gradeId", "There is no such grade here.");
}

/** Adds an empty bin. Throws `conflict` when its label is taken. */
export async function addBin(ctx: Context, input: BinInput): Promise<Bin> {
  return transact(ctx, async (tx) => {
    await requireGradeHere(tx, ctx, input.gradeId);
    const id = input.id ?? newId();
    const { label, gradeId, tare, place = null, sellPoint = null } = input;
    try {
      await tx.insert(bins).values({ outfitId: ctx.outfit.id, id, label, gradeId, tare, place, sellPoint });
    } catch (error) {
      throw labelTaken(error, label);
    }
    await audit(tx, ctx, "add-bin", { type: "bin", id });
    return requireBin(tx, ctx, id);
  });
}

/** MariaDB's number for a change of a key that rows elsewhere point at. */
const STILL_POINTED_AT = 1451;

/**
 * Why the database did not take a change. Every line, weigh-in, count and ticket that names a bin names its grade with it, so the keys
 * themselves keep the grade of a bin that was used, also one that a draft ticket names at this moment.
 */
function whyNotChanged(error: unknown, bin: Bin, label: string): unknown {
  if (databaseErrorNumber(error) !== STILL_POINTED_AT) return labelTaken(error, label);
  const message = `${bin.label} was used for ${bin.gradeName}. Add another bin for the other grade.`;
  return new AppError("conflict", message, { errors: [{ path: "gradeId", message }], cause: error });
}

/** Changes a bin. Throws `stale` when somebody changed it first, `conflict` for what its contents do not allow. */
export async function changeBin(ctx: Context, id: string, change: BinChange): Promise<Bin> {
  return transact(ctx, async (tx) => {
    // The books' lock keeps what the bin holds as it is until the change is made.
    await openBooks(tx, ctx);
    const before = await requireBin(tx, ctx, id);
    if (before.version !== ctx.ifMatch) throw new AppError("stale", `${before.label} was changed since you opened it. Look at it again.`, { current: before });
    const { putAway, gradeId, ...words } = change;
    if (gradeId !== undefined) await requireGradeHere(tx, ctx, gradeId);
    if (putAway && !isZero(before.balance)) {
      throw new AppError("conflict", `${before.label} still holds ${before.balance} ${ctx.outfit.weightUnit}. Sell it or count it to 0 first.`);
    }
    const putAwayAt = putAway === undefined ? {} : { putAwayAt: putAway ? ctx.now : null };
    try {
      await tx
        .update(bins)
        .set({ ...words, ...(gradeId === undefined ? {} : { gradeId }), ...putAwayAt, version: before.version + 1 })
        .where(and(eq(bins.outfitId, ctx.outfit.id), eq(bins.id, id)));
    } catch (error) {
      throw whyNotChanged(error, before, change.label ?? before.label);
    }
    await audit(tx, ctx, "change-bin", { type: "bin", id }, { before, change });
    return requireBin(tx, ctx, id);
  });
}
