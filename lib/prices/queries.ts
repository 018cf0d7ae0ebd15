import "server-only";
import { and, asc, desc, eq, gte, isNull, lt, lte, or, sql } from "drizzle-orm";
import { alias } from "drizzle-orm/mysql-core";
import type { Reader } from "@/db/client";
import { gradeAliases, grades, memberships, priceSheetLines, priceSheets, users, yards } from "@/db/schema";
import { compare, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import type { PriceUnit } from "@/lib/arithmetic/price";
import { isRealDate } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import type { Sheet, SheetListQuery, Yard } from "./schema";

/** A price in force at a yard on a day. `normalised` is money per book unit, null for prices per piece. */
export type PriceInForce = {
  gradeId: string;
  gradeName: string;
  family: (typeof grades.$inferSelect)["family"];
  position: number;
  yardId: string;
  yardName: string;
  sheetId: string;
  inForceFrom: string;
  price: DecimalString;
  per: PriceUnit;
  normalised: DecimalString | null;
  yardWording: string | null;
};

/** The highest price in force for a grade, comparable per book unit. */
export type BestPrice = {
  gradeId: string;
  normalised: DecimalString;
  price: DecimalString;
  per: PriceUnit;
  yardId: string;
  yardName: string;
  sheetId: string;
  inForceFrom: string;
};

/**
 * Every price in force on a day among the active yards: of each yard its sheet with the latest start on or before that day, unless the day is
 * past the sheet's own last day. One query.
 */
export async function pricesInForce(db: Reader, { outfitId, on }: { outfitId: string; on: string }): Promise<PriceInForce[]> {
  const later = alias(priceSheets, "later");
  const rows = await db
    .select({
      gradeId: priceSheetLines.gradeId,
      gradeName: grades.name,
      family: grades.family,
      position: grades.position,
      yardId: yards.id,
      yardName: yards.name,
      sheetId: priceSheets.id,
      inForceFrom: priceSheets.inForceFrom,
      price: priceSheetLines.price,
      per: priceSheetLines.per,
      normalised: priceSheetLines.normalised,
      yardWording: priceSheetLines.yardWording,
    })
    .from(priceSheets)
    .innerJoin(yards, and(eq(yards.outfitId, priceSheets.outfitId), eq(yards.id, priceSheets.yardId), eq(yards.active, true)))
    .innerJoin(priceSheetLines, and(eq(priceSheetLines.outfitId, priceSheets.outfitId), eq(priceSheetLines.sheetId, priceSheets.id)))
    .innerJoin(grades, and(eq(grades.outfitId, priceSheetLines.outfitId), eq(grades.id, priceSheetLines.gradeId)))
    .where(
      and(
        eq(priceSheets.outfitId, outfitId),
        eq(
          priceSheets.inForceFrom,
          db
            .select({ start: sql`max(${later.inForceFrom})` })
            .from(later)
            .where(and(eq(later.outfitId, priceSheets.outfitId), eq(later.yardId, priceSheets.yardId), lte(later.inForceFrom, on))),
        ),
        or(isNull(priceSheets.lastDay), gte(priceSheets.lastDay, on)),
      ),
    )
    .orderBy(asc(grades.position), asc(yards.name));
  return rows.map((row) => ({ ...row, price: trim(row.price), normalised: row.normalised === null ? null : trim(row.normalised) }));
}

/** Of prices in force, the highest per book unit of each grade; the yard whose name comes first where two pay the same. */
export function bestOf(prices: PriceInForce[]): Map<string, BestPrice> {
  const best = new Map<string, BestPrice>();
  for (const { gradeId, normalised, price, per, yardId, yardName, sheetId, inForceFrom } of prices) {
    if (normalised === null) continue;
    const known = best.get(gradeId);
    if (known === undefined || compare(normalised, known.normalised) > 0)
      best.set(gradeId, { gradeId, normalised, price, per, yardId, yardName, sheetId, inForceFrom });
  }
  return best;
}

/** The best price in force for each grade on a day, by grade id. */
export const bestPrices = async (db: Reader, scope: { outfitId: string; on: string }): Promise<Map<string, BestPrice>> =>
  bestOf(await pricesInForce(db, scope));

const yardColumns = {
  id: yards.id,
  name: yards.name,
  place: yards.place,
  phone: yards.phone,
  hours: yards.hours,
  note: yards.note,
  active: yards.active,
  version: yards.version,
};

/** The outfit's yards by name, those in use first. There are few, so one page holds them. */
export const listYards = (db: Reader, { outfitId }: { outfitId: string }): Promise<Yard[]> =>
  db.select(yardColumns).from(yards).where(eq(yards.outfitId, outfitId)).orderBy(desc(yards.active), asc(yards.name));

/** One yard, or null. */
export async function getYard(db: Reader, { outfitId, id }: { outfitId: string; id: string }): Promise<Yard | null> {
  if (!isId(id)) return null;
  const [yard] = await db
    .select(yardColumns)
    .from(yards)
    .where(and(eq(yards.outfitId, outfitId), eq(yards.id, id)));
  return yard ?? null;
}

const selectSheets = (db: Reader) =>
  db
    .select({
      id: priceSheets.id,
      yardId: priceSheets.yardId,
      yardName: yards.name,
      inForceFrom: priceSheets.inForceFrom,
      lastDay: priceSheets.lastDay,
      lineCount: sql<number>`(select count(*) from price_sheet_lines l where l.outfit_id = ${priceSheets.outfitId} and l.sheet_id = ${priceSheets.id})`.mapWith(
        Number,
      ),
      makerId: priceSheets.madeBy,
      makerName: users.name,
      madeAt: priceSheets.madeAt,
      version: priceSheets.version,
    })
    .from(priceSheets)
    .innerJoin(yards, and(eq(yards.outfitId, priceSheets.outfitId), eq(yards.id, priceSheets.yardId)))
    .innerJoin(memberships, and(eq(memberships.outfitId, priceSheets.outfitId), eq(memberships.id, priceSheets.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId));

type SheetRow = Awaited<ReturnType<ReturnType<typeof selectSheets>["execute"]>>[number];

const headOf = ({ makerId, makerName, madeAt, ...row }: SheetRow) => ({ ...row, madeBy: { id: makerId, name: makerName }, madeAt: madeAt.toISOString() });

/** A page of price sheets, the latest start first. */
export async function listSheets(db: Reader, { outfitId, ...query }: { outfitId: string } & SheetListQuery) {
  const after = decodeCursor(query.cursor);
  if (after && (!isRealDate(after.at) || !isId(after.id))) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  const rows = await selectSheets(db)
    .where(
      and(
        eq(priceSheets.outfitId, outfitId),
        query.yardId ? eq(priceSheets.yardId, query.yardId) : undefined,
        after ? and(lte(priceSheets.inForceFrom, after.at), or(lt(priceSheets.inForceFrom, after.at), lt(priceSheets.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(priceSheets.inForceFrom), desc(priceSheets.id))
    .limit(query.limit + 1);
  const page = toPage(rows, query.limit, (row) => ({ at: row.inForceFrom, id: row.id }));
  return { items: page.items.map(headOf), nextCursor: page.nextCursor };
}

/** One price sheet with its lines, or null. */
export async function getSheet(db: Reader, { outfitId, id }: { outfitId: string; id: string }): Promise<Sheet | null> {
  if (!isId(id)) return null;
  const [row] = await selectSheets(db).where(and(eq(priceSheets.outfitId, outfitId), eq(priceSheets.id, id)));
  if (!row) return null;
  const lines = await db
    .select({
      gradeId: priceSheetLines.gradeId,
      gradeName: grades.name,
      family: grades.family,
      price: priceSheetLines.price,
      per: priceSheetLines.per,
      normalised: priceSheetLines.normalised,
      yardWording: priceSheetLines.yardWording,
    })
    .from(priceSheetLines)
    .innerJoin(grades, and(eq(grades.outfitId, priceSheetLines.outfitId), eq(grades.id, priceSheetLines.gradeId)))
    .where(and(eq(priceSheetLines.outfitId, outfitId), eq(priceSheetLines.sheetId, id)))
    .orderBy(asc(priceSheetLines.line));
  return {
    ...headOf(row),
    lines: lines.map((line) => ({ ...line, price: trim(line.price), normalised: line.normalised === null ? null : trim(line.normalised) })),
  };
}

/** The sheet of a yard that starts last, to copy from; null when it has none. */
export async function latestSheetId(db: Reader, { outfitId, yardId }: { outfitId: string; yardId: string }): Promise<string | null> {
  if (!isId(yardId)) return null;
  const [row] = await db
    .select({ id: priceSheets.id })
    .from(priceSheets)
    .where(and(eq(priceSheets.outfitId, outfitId), eq(priceSheets.yardId, yardId)))
    .orderBy(desc(priceSheets.inForceFrom))
    .limit(1);
  return row?.id ?? null;
}

/** How each yard calls our grades, remembered from its sheets and tickets. */
export const aliasesOf = (db: Reader, { outfitId }: { outfitId: string }) =>
  db
    .select({ yardId: gradeAliases.yardId, gradeId: gradeAliases.gradeId, wording: gradeAliases.wording })
    .from(gradeAliases)
    .where(eq(gradeAliases.outfitId, outfitId));
