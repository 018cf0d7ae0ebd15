import "server-only";
import { and, eq, inArray, sql } from "drizzle-orm";
import { database } from "@/db/client";
import { gradeAliases, grades, priceSheetLines, priceSheets, yards } from "@/db/schema";
import { isDuplicateKey, type Transaction } from "@/db/transaction";
import { normalisePrice } from "@/lib/arithmetic/price";
import type { Context } from "@/lib/auth/context";
import { seesPrices } from "@/lib/auth/permissions";
import { audit, transact } from "@/lib/books/transact";
import { addDays, daysBetween } from "@/lib/clock";
import { AppError, fieldError, notFound } from "@/lib/http/errors";
import { newId } from "@/lib/ids";
import { bestOf, getSheet, getYard, listSheets, listYards, pricesInForce, type PriceInForce } from "./queries";
import type { Prices, Quote, Sheet, SheetChange, SheetInput, SheetListQuery, Yard, YardChange, YardInput } from "./schema";

const FARTHEST_AHEAD_DAYS = 366;

/** Prices are the owner's to hide. Throws `forbidden` for those they are hidden from. */
function requirePricesSeen(ctx: Context): void {
  if (!seesPrices(ctx.actor.role, ctx.outfit.hidesMoney)) throw new AppError("forbidden", `${ctx.outfit.name} keeps prices to the office. Ask the owner.`);
}

/** All yards of the outfit. */
export async function seeYards(ctx: Context): Promise<{ items: Yard[]; nextCursor: null }> {
  return { items: await listYards(database(), { outfitId: ctx.outfit.id }), nextCursor: null };
}

async function requireYard(tx: Parameters<typeof getYard>[0], ctx: Context, id: string): Promise<Yard> {
  const yard = await getYard(tx, { outfitId: ctx.outfit.id, id });
  if (!yard) throw notFound("yard");
  return yard;
}

function yardNameTaken(error: unknown, name: string): unknown {
  if (!isDuplicateKey(error)) return error;
  const message = `There is a yard called ${name} already. Use that one, or take another name.`;
  return new AppError("conflict", message, { errors: [{ path: "name", message }], cause: error });
}

/** Adds a yard. Throws `conflict` when the name is taken. */
export async function addYard(ctx: Context, input: YardInput): Promise<Yard> {
  return transact(ctx, async (tx) => {
    const id = input.id ?? newId();
    try {
      await tx.insert(yards).values({ ...input, outfitId: ctx.outfit.id, id });
    } catch (error) {
      throw yardNameTaken(error, input.name);
    }
    await audit(tx, ctx, "add-yard", { type: "yard", id });
    return requireYard(tx, ctx, id);
  });
}

/** Changes a yard. Throws `stale` with the yard as it is when somebody changed it first. */
export async function changeYard(ctx: Context, id: string, change: YardChange): Promise<Yard> {
  return transact(ctx, async (tx) => {
    const before = await requireYard(tx, ctx, id);
    if (before.version !== ctx.ifMatch) throw new AppError("stale", `${before.name} was changed since you opened it. Look at it again.`, { current: before });
    try {
      const [result] = await tx
        .update(yards)
        .set({ ...change, version: before.version + 1 })
        .where(and(eq(yards.outfitId, ctx.outfit.id), eq(yards.id, id), eq(yards.version, before.version)));
      if (result.affectedRows === 0)
        throw new AppError("stale", `${before.name} was changed since you opened it. Look at it again.`, { current: await requireYard(tx, ctx, id) });
    } catch (error) {
      throw yardNameTaken(error, change.name ?? before.name);
    }
    await audit(tx, ctx, "change-yard", { type: "yard", id }, { before, change });
    return requireYard(tx, ctx, id);
  });
}

/** A page of price sheets. */
export function seeSheets(ctx: Context, query: SheetListQuery) {
  requirePricesSeen(ctx);
  return listSheets(database(), { outfitId: ctx.outfit.id, ...query });
}

/** One price sheet. Throws `not-found`. */
export async function requireSheet(ctx: Context, id: string): Promise<Sheet> {
  requirePricesSeen(ctx);
  const sheet = await getSheet(database(), { outfitId: ctx.outfit.id, id });
  if (!sheet) throw notFound("price sheet");
  return sheet;
}

type Lines = SheetInput["lines"];

/** Throws `input` that names each line whose grade is not here. */
async function requireGrades(tx: Transaction, ctx: Context, lines: Lines): Promise<void> {
  const ids = lines.map((line) => line.gradeId);
  const known = await tx
    .select({ id: grades.id })
    .from(grades)
    .where(and(eq(grades.outfitId, ctx.outfit.id), inArray(grades.id, ids)));
  const here = new Set(known.map((grade) => grade.id));
  const errors = ids.flatMap((id, index) => (here.has(id) ? [] : [{ path: `lines.${index}.gradeId`, message: "There is no such grade here." }]));
  if (errors.length > 0) throw new AppError("input", "There is no such grade here.", { errors });
}

function requireNear(ctx: Context, inForceFrom: string): void {
  if (inForceFrom > addDays(ctx.today, FARTHEST_AHEAD_DAYS)) throw fieldError("inForceFrom", "In force from must be within a year from today.");
}

async function writeLines(tx: Transaction, ctx: Context, sheet: { id: string; yardId: string }, lines: Lines): Promise<void> {
  await tx.insert(priceSheetLines).values(
    lines.map((line, index) => ({
      outfitId: ctx.outfit.id,
      sheetId: sheet.id,
      line: index + 1,
      gradeId: line.gradeId,
      price: line.price,
      per: line.per,
      normalised: normalisePrice(line.price, line.per, ctx.outfit.weightUnit),
      yardWording: line.yardWording ?? null,
    })),
  );
  await rememberWordings(tx, ctx, sheet.yardId, lines);
}

/** Keeps how a yard calls our grades; the latest use of a wording counts. */
export async function rememberWordings(
  tx: Transaction,
  ctx: Context,
  yardId: string,
  lines: { gradeId: string; yardWording?: string | undefined }[],
): Promise<void> {
  const said = new Map(lines.flatMap(({ gradeId, yardWording }) => (yardWording === undefined ? [] : [[yardWording, gradeId] as const])));
  if (said.size === 0) return;
  await tx
    .insert(gradeAliases)
    .values([...said].map(([wording, gradeId]) => ({ outfitId: ctx.outfit.id, yardId, wording, gradeId })))
    .onDuplicateKeyUpdate({ set: { gradeId: sql`values(grade_id)` } });
}

function dayTaken(error: unknown, yard: string): unknown {
  if (!isDuplicateKey(error)) return error;
  const message = `${yard} has a sheet from that day already. Open that one and change it.`;
  return new AppError("conflict", message, { errors: [{ path: "inForceFrom", message }], cause: error });
}

/** Adds a yard's price sheet. Throws `conflict` when the yard has one from that day. */
export async function addSheet(ctx: Context, input: SheetInput): Promise<Sheet> {
  requireNear(ctx, input.inForceFrom);
  return transact(ctx, async (tx) => {
    const yard = await getYard(tx, { outfitId: ctx.outfit.id, id: input.yardId });
    if (!yard) throw fieldError("yardId", "There is no such yard here.");
    await requireGrades(tx, ctx, input.lines);
    const id = input.id ?? newId();
    const { yardId, inForceFrom, lastDay = null } = input;
    try {
      await tx.insert(priceSheets).values({ outfitId: ctx.outfit.id, id, yardId, inForceFrom, lastDay, madeBy: ctx.actor.memberId, madeAt: ctx.now });
    } catch (error) {
      throw dayTaken(error, yard.name);
    }
    await writeLines(tx, ctx, { id, yardId }, input.lines);
    await audit(tx, ctx, "add-price-sheet", { type: "price-sheet", id });
    return requireSheetIn(tx, ctx, id);
  });
}

async function requireSheetIn(tx: Transaction, ctx: Context, id: string): Promise<Sheet> {
  const sheet = await getSheet(tx, { outfitId: ctx.outfit.id, id });
  if (!sheet) throw notFound("price sheet");
  return sheet;
}

/** Types a sheet again. Throws `stale` when somebody changed it first. */
export async function changeSheet(ctx: Context, id: string, change: SheetChange): Promise<Sheet> {
  requireNear(ctx, change.inForceFrom);
  return transact(ctx, async (tx) => {
    const before = await requireSheetIn(tx, ctx, id);
    const stale = (current: Sheet) => new AppError("stale", "The sheet was changed since you opened it. Look at it again.", { current });
    if (before.version !== ctx.ifMatch) throw stale(before);
    await requireGrades(tx, ctx, change.lines);
    const where = and(eq(priceSheets.outfitId, ctx.outfit.id), eq(priceSheets.id, id), eq(priceSheets.version, before.version));
    try {
      const [result] = await tx
        .update(priceSheets)
        .set({ inForceFrom: change.inForceFrom, lastDay: change.lastDay ?? null, version: before.version + 1 })
        .where(where);
      if (result.affectedRows === 0) throw stale(await requireSheetIn(tx, ctx, id));
    } catch (error) {
      throw dayTaken(error, before.yardName);
    }
    await tx.delete(priceSheetLines).where(and(eq(priceSheetLines.outfitId, ctx.outfit.id), eq(priceSheetLines.sheetId, id)));
    await writeLines(tx, ctx, { id, yardId: before.yardId }, change.lines);
    await audit(tx, ctx, "change-price-sheet", { type: "price-sheet", id }, { before: before.lines });
    return requireSheetIn(tx, ctx, id);
  });
}

const quoteOf = (ctx: Context, on: string, line: PriceInForce): Quote => {
  const ageDays = daysBetween(line.inForceFrom, on);
  const { yardId, yardName, sheetId, price, per, normalised, yardWording, inForceFrom } = line;
  return { yardId, yardName, sheetId, price, per, normalised, yardWording, inForceFrom, ageDays, stale: ageDays > ctx.outfit.staleAfterDays };
};

/** Prices in force on a day, today unless said: of each grade the best, and what every yard pays. */
export async function seePrices(ctx: Context, { on = ctx.today }: { on?: string | undefined }): Promise<Prices> {
  requirePricesSeen(ctx);
  const lines = await pricesInForce(database(), { outfitId: ctx.outfit.id, on });
  const best = bestOf(lines);
  const byGrade = new Map<string, Prices["grades"][number]>();
  for (const line of lines) {
    const quote = quoteOf(ctx, on, line);
    const entry = byGrade.get(line.gradeId) ?? { gradeId: line.gradeId, gradeName: line.gradeName, family: line.family, best: null, yards: [] };
    entry.yards.push(quote);
    if (best.get(line.gradeId)?.yardId === line.yardId) entry.best = quote;
    byGrade.set(line.gradeId, entry);
  }
  return { on, grades: [...byGrade.values()] };
}
