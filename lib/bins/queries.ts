import "server-only";
import { and, asc, desc, eq, gt, gte, isNull, lt, lte, or, sql } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { binBalances, bins, counts, grades, gradeStock, lots, memberships, movementLines, movements, pickups, users, weighIns } from "@/db/schema";
import { trim } from "@/lib/arithmetic/decimal";
import { isRealDate } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage, type Cursor } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import type { Bin, Count, CountListQuery, WeighIn, WeighInListQuery } from "./schema";

const selectBins = (db: Reader) =>
  db
    .select({
      id: bins.id,
      label: bins.label,
      gradeId: bins.gradeId,
      gradeName: grades.name,
      family: grades.family,
      position: grades.position,
      place: bins.place,
      tare: bins.tare,
      sellPoint: bins.sellPoint,
      quantity: binBalances.quantity,
      heldSince: binBalances.heldSince,
      putAwayAt: bins.putAwayAt,
      version: bins.version,
    })
    .from(bins)
    .innerJoin(grades, and(eq(grades.outfitId, bins.outfitId), eq(grades.id, bins.gradeId)))
    .leftJoin(binBalances, and(eq(binBalances.outfitId, bins.outfitId), eq(binBalances.binId, bins.id)));

type BinRow = Awaited<ReturnType<ReturnType<typeof selectBins>["execute"]>>[number];

const binOf = ({ position: _position, quantity, ...row }: BinRow): Bin => ({
  ...row,
  tare: trim(row.tare),
  sellPoint: row.sellPoint === null ? null : trim(row.sellPoint),
  balance: trim(quantity ?? "0"),
  putAwayAt: row.putAwayAt?.toISOString() ?? null,
});

/** In use, or put away and yet holding metal that a void gave back: what is held is never out of sight. */
const inUseOrHolding = or(isNull(bins.putAwayAt), gt(binBalances.quantity, "0"));

/** The outfit's bins in the order of the grades, those in use or not empty unless `all`. There are few, so one page holds them. */
export async function listBins(
  db: Reader,
  { outfitId, all = false, gradeId }: { outfitId: string; all?: boolean; gradeId?: string | undefined },
): Promise<Bin[]> {
  const rows = await selectBins(db)
    .where(and(eq(bins.outfitId, outfitId), all ? undefined : inUseOrHolding, gradeId ? eq(bins.gradeId, gradeId) : undefined))
    .orderBy(asc(grades.position), asc(bins.label));
  return rows.map(binOf);
}

/** One bin with what it holds, or null. */
export async function getBin(db: Reader, { outfitId, id }: { outfitId: string; id: string }): Promise<Bin | null> {
  if (!isId(id)) return null;
  const [row] = await selectBins(db).where(and(eq(bins.outfitId, outfitId), eq(bins.id, id)));
  return row ? binOf(row) : null;
}

/** What the outfit holds of a grade: over how many bins, since when, at what cost, and when it wants to sell. */
export type GradeHolding = {
  gradeId: string;
  name: string;
  family: Bin["family"];
  quantity: string;
  costMinor: number;
  bins: number;
  heldSince: string | null;
  sellPoint: string | null;
};

/** Every grade that has a bin in use or not empty, in the catalogue's order. One query. */
export async function gradeStockList(db: Reader, { outfitId }: { outfitId: string }): Promise<GradeHolding[]> {
  const rows = await db
    .select({
      gradeId: grades.id,
      name: grades.name,
      family: grades.family,
      quantity: gradeStock.quantity,
      costMinor: gradeStock.costMinor,
      bins: sql<number>`count(${bins.id})`.mapWith(Number),
      heldSince: sql<string | null>`min(${binBalances.heldSince})`,
      sellPoint: sql<string | null>`sum(${bins.sellPoint})`,
    })
    .from(bins)
    .innerJoin(grades, and(eq(grades.outfitId, bins.outfitId), eq(grades.id, bins.gradeId)))
    .leftJoin(binBalances, and(eq(binBalances.outfitId, bins.outfitId), eq(binBalances.binId, bins.id)))
    .leftJoin(gradeStock, and(eq(gradeStock.outfitId, bins.outfitId), eq(gradeStock.gradeId, bins.gradeId)))
    .where(and(eq(bins.outfitId, outfitId), inUseOrHolding))
    .groupBy(grades.id, grades.name, grades.family, grades.position, gradeStock.quantity, gradeStock.costMinor)
    .orderBy(asc(grades.position));
  return rows.map((row) => ({
    ...row,
    quantity: trim(row.quantity ?? "0"),
    costMinor: row.costMinor ?? 0,
    sellPoint: row.sellPoint === null ? null : trim(row.sellPoint),
  }));
}

/** The open pickups that still have weight on the pile, oldest first. */
export async function openLots(db: Reader, { outfitId }: { outfitId: string }) {
  return db
    .select({
      pickupId: lots.pickupId,
      number: pickups.number,
      pickedUpOn: pickups.pickedUpOn,
      place: pickups.place,
      remainingWeight: lots.remainingWeight,
      remainingCostMinor: lots.remainingCostMinor,
    })
    .from(pickups)
    .innerJoin(lots, and(eq(lots.outfitId, pickups.outfitId), eq(lots.pickupId, pickups.id)))
    .where(and(eq(pickups.outfitId, outfitId), eq(pickups.state, "open"), sql`${lots.remainingWeight} > 0`))
    .orderBy(asc(pickups.pickedUpOn), asc(pickups.number));
}

function readCursor(text: string | undefined): Cursor | null {
  const after = decodeCursor(text);
  if (after && (!isRealDate(after.at) || !isId(after.id))) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  return after;
}

const selectWeighIns = (db: Reader) =>
  db
    .select({
      id: weighIns.id,
      binId: weighIns.binId,
      binLabel: bins.label,
      gradeId: weighIns.gradeId,
      gradeName: grades.name,
      family: grades.family,
      weighedOn: weighIns.weighedOn,
      pickupId: weighIns.pickupId,
      pickupNumber: pickups.number,
      fromPile: weighIns.fromPile,
      gross: weighIns.gross,
      tare: weighIns.tare,
      net: weighIns.net,
      draws: weighIns.draws,
      unit: weighIns.unit,
      note: weighIns.note,
      makerId: weighIns.madeBy,
      makerName: users.name,
      madeAt: weighIns.madeAt,
      voidedAt: weighIns.voidedAt,
      quantity: binBalances.quantity,
    })
    .from(weighIns)
    .innerJoin(bins, and(eq(bins.outfitId, weighIns.outfitId), eq(bins.id, weighIns.binId)))
    .innerJoin(grades, and(eq(grades.outfitId, weighIns.outfitId), eq(grades.id, weighIns.gradeId)))
    .innerJoin(memberships, and(eq(memberships.outfitId, weighIns.outfitId), eq(memberships.id, weighIns.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId))
    .leftJoin(pickups, and(eq(pickups.outfitId, weighIns.outfitId), eq(pickups.id, weighIns.pickupId)))
    .leftJoin(binBalances, and(eq(binBalances.outfitId, weighIns.outfitId), eq(binBalances.binId, weighIns.binId)));

type WeighInRow = Awaited<ReturnType<ReturnType<typeof selectWeighIns>["execute"]>>[number];

// MariaDB's JSON is text; the driver hands it over either way.
const drawsRead = (draws: WeighInRow["draws"] | string) => (typeof draws === "string" ? (JSON.parse(draws) as WeighInRow["draws"]) : draws);

const weighInOf = ({ makerId, makerName, quantity, ...row }: WeighInRow): WeighIn => ({
  ...row,
  gross: trim(row.gross),
  tare: trim(row.tare),
  net: trim(row.net),
  draws: drawsRead(row.draws),
  madeBy: { id: makerId, name: makerName },
  madeAt: row.madeAt.toISOString(),
  voidedAt: row.voidedAt?.toISOString() ?? null,
  binBalance: trim(quantity ?? "0"),
});

/** A page of weigh-ins, newest first. */
export async function listWeighIns(db: Reader, { outfitId, ...query }: { outfitId: string } & WeighInListQuery) {
  const after = readCursor(query.cursor);
  const rows = await selectWeighIns(db)
    .where(
      and(
        eq(weighIns.outfitId, outfitId),
        query.binId ? eq(weighIns.binId, query.binId) : undefined,
        query.pickupId ? eq(weighIns.pickupId, query.pickupId) : undefined,
        query.from ? gte(weighIns.weighedOn, query.from) : undefined,
        query.to ? lte(weighIns.weighedOn, query.to) : undefined,
        after ? and(lte(weighIns.weighedOn, after.at), or(lt(weighIns.weighedOn, after.at), lt(weighIns.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(weighIns.weighedOn), desc(weighIns.id))
    .limit(query.limit + 1);
  const page = toPage(rows, query.limit, (row) => ({ at: row.weighedOn, id: row.id }));
  return { items: page.items.map(weighInOf), nextCursor: page.nextCursor };
}

/** One weigh-in, or null. */
export async function getWeighIn(db: Reader, { outfitId, id }: { outfitId: string; id: string }): Promise<WeighIn | null> {
  if (!isId(id)) return null;
  const [row] = await selectWeighIns(db).where(and(eq(weighIns.outfitId, outfitId), eq(weighIns.id, id)));
  return row ? weighInOf(row) : null;
}

/** The pickups whose lots a weigh-in drew from, in a fixed order. */
export async function pickupsDrawnBy(db: Reader, { outfitId, weighInId }: { outfitId: string; weighInId: string }): Promise<string[]> {
  const rows = await db
    .selectDistinct({ pickupId: movementLines.pickupId })
    .from(movements)
    .innerJoin(movementLines, and(eq(movementLines.outfitId, movements.outfitId), eq(movementLines.movementId, movements.id), eq(movementLines.place, "pile")))
    .where(and(eq(movements.outfitId, outfitId), eq(movements.documentType, "weigh-in"), eq(movements.documentId, weighInId), isNull(movements.reversesId)))
    .orderBy(asc(movementLines.pickupId));
  return rows.flatMap((row) => (row.pickupId === null ? [] : [row.pickupId]));
}

const selectCounts = (db: Reader) =>
  db
    .select({
      id: counts.id,
      binId: counts.binId,
      binLabel: bins.label,
      gradeId: counts.gradeId,
      gradeName: grades.name,
      family: grades.family,
      countedOn: counts.countedOn,
      gross: counts.gross,
      tare: counts.tare,
      net: counts.net,
      bookQuantity: counts.bookQuantity,
      difference: counts.difference,
      note: counts.note,
      makerId: counts.madeBy,
      makerName: users.name,
      madeAt: counts.madeAt,
      voidedAt: counts.voidedAt,
    })
    .from(counts)
    .innerJoin(bins, and(eq(bins.outfitId, counts.outfitId), eq(bins.id, counts.binId)))
    .innerJoin(grades, and(eq(grades.outfitId, counts.outfitId), eq(grades.id, counts.gradeId)))
    .innerJoin(memberships, and(eq(memberships.outfitId, counts.outfitId), eq(memberships.id, counts.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId));

type CountRow = Awaited<ReturnType<ReturnType<typeof selectCounts>["execute"]>>[number];

const countOf = ({ makerId, makerName, ...row }: CountRow): Count => ({
  ...row,
  gross: trim(row.gross),
  tare: trim(row.tare),
  net: trim(row.net),
  bookQuantity: trim(row.bookQuantity),
  difference: trim(row.difference),
  madeBy: { id: makerId, name: makerName },
  madeAt: row.madeAt.toISOString(),
  voidedAt: row.voidedAt?.toISOString() ?? null,
});

/** A page of counts, newest first. */
export async function listCounts(db: Reader, { outfitId, ...query }: { outfitId: string } & CountListQuery) {
  const after = readCursor(query.cursor);
  const rows = await selectCounts(db)
    .where(
      and(
        eq(counts.outfitId, outfitId),
        query.binId ? eq(counts.binId, query.binId) : undefined,
        query.from ? gte(counts.countedOn, query.from) : undefined,
        query.to ? lte(counts.countedOn, query.to) : undefined,
        after ? and(lte(counts.countedOn, after.at), or(lt(counts.countedOn, after.at), lt(counts.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(counts.countedOn), desc(counts.id))
    .limit(query.limit + 1);
  const page = toPage(rows, query.limit, (row) => ({ at: row.countedOn, id: row.id }));
  return { items: page.items.map(countOf), nextCursor: page.nextCursor };
}

/** One count, or null. */
export async function getCount(db: Reader, { outfitId, id }: { outfitId: string; id: string }): Promise<Count | null> {
  if (!isId(id)) return null;
  const [row] = await selectCounts(db).where(and(eq(counts.outfitId, outfitId), eq(counts.id, id)));
  return row ? countOf(row) : null;
}
