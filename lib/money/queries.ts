import "server-only";
import { and, count, desc, eq, gte, inArray, lt, lte, ne, or, sql } from "drizzle-orm";
import type { Reader } from "@/db/client";
import { accountMonths, accounts, costs, grades, memberships, months, movementLines, pickups, postings, users } from "@/db/schema";
import type { DecimalString } from "@/lib/arithmetic/decimal";
import { minorFromDecimal } from "@/lib/arithmetic/money";
import { monthBounds, isRealDate, shiftMonth } from "@/lib/clock";
import { fieldError } from "@/lib/http/errors";
import { decodeCursor, toPage } from "@/lib/http/page";
import { isId } from "@/lib/ids";
import { addToGrade, earningsOf, type AccountMonth, type GradeMonth } from "./rules";
import type { Cost, CostListQuery, Earnings, Month } from "./schema";

/** A sum of minor units, which the database hands over as text. */
export function minorOf(text: string): number {
  const minor = minorFromDecimal(text, 0);
  if (minor === null) throw new RangeError(`not a whole amount: ${text}`);
  return minor;
}

const selectCosts = (db: Reader) =>
  db
    .select({
      id: costs.id,
      spentOn: costs.spentOn,
      kind: costs.kind,
      amountMinor: costs.amountMinor,
      paidFrom: costs.paidFrom,
      note: costs.note,
      makerId: costs.madeBy,
      makerName: users.name,
      madeAt: costs.madeAt,
      voidedAt: costs.voidedAt,
      version: costs.version,
    })
    .from(costs)
    .innerJoin(memberships, and(eq(memberships.outfitId, costs.outfitId), eq(memberships.id, costs.madeBy)))
    .innerJoin(users, eq(users.id, memberships.userId));

type CostRow = Awaited<ReturnType<ReturnType<typeof selectCosts>["execute"]>>[number];

const costOf = ({ makerId, makerName, madeAt, voidedAt, ...row }: CostRow): Cost => ({
  ...row,
  madeBy: { id: makerId, name: makerName },
  madeAt: madeAt.toISOString(),
  voidedAt: voidedAt?.toISOString() ?? null,
});

/** A page of costs, newest first. `ownOf` leaves only those of one member. */
export async function listCosts(db: Reader, { outfitId, ownOf, ...query }: { outfitId: string; ownOf: string | null } & CostListQuery) {
  const after = decodeCursor(query.cursor);
  if (after && (!isRealDate(after.at) || !isId(after.id))) throw fieldError("cursor", "That is not a cursor of this list. Start from the first page.");
  const rows = await selectCosts(db)
    .where(
      and(
        eq(costs.outfitId, outfitId),
        ownOf === null ? undefined : eq(costs.madeBy, ownOf),
        query.kind ? eq(costs.kind, query.kind) : undefined,
        query.from ? gte(costs.spentOn, query.from) : undefined,
        query.to ? lte(costs.spentOn, query.to) : undefined,
        after ? and(lte(costs.spentOn, after.at), or(lt(costs.spentOn, after.at), lt(costs.id, after.id))) : undefined,
      ),
    )
    .orderBy(desc(costs.spentOn), desc(costs.id))
    .limit(query.limit + 1);
  const page = toPage(rows, query.limit, (row) => ({ at: row.spentOn, id: row.id }));
  return { items: page.items.map(costOf), nextCursor: page.nextCursor };
}

/** One cost, or null; with `ownOf`, only when that member made it. */
export async function getCost(db: Reader, { outfitId, id, ownOf }: { outfitId: string; id: string; ownOf: string | null }): Promise<Cost | null> {
  if (!isId(id)) return null;
  const [row] = await selectCosts(db).where(and(eq(costs.outfitId, outfitId), eq(costs.id, id), ownOf === null ? undefined : eq(costs.madeBy, ownOf)));
  return row ? costOf(row) : null;
}

type Months = { outfitId: string; first: string; before: string; month: string };

async function accountsOfMonths(db: Reader, { outfitId, before, month }: Months): Promise<(AccountMonth & { month: string })[]> {
  const rows = await db
    .select({ month: accountMonths.month, account: accounts.code, name: accounts.name, kind: accounts.kind, amountMinor: accountMonths.amountMinor })
    .from(accountMonths)
    .innerJoin(accounts, and(eq(accounts.outfitId, accountMonths.outfitId), eq(accounts.code, accountMonths.account)))
    .where(and(eq(accountMonths.outfitId, outfitId), inArray(accountMonths.month, [before, month]), inArray(accounts.kind, ["income", "expense"])))
    .orderBy(accounts.position);
  return rows.map((row) => ({ ...row, kind: row.kind === "income" ? "income" : "expense" }));
}

/** Sales and cost by grade over both months: one reading of the covering index. */
const postingsOfMonths = (db: Reader, { outfitId, first, before, month }: Months) =>
  db
    .select({
      account: postings.account,
      gradeId: postings.gradeId,
      late: sql<string>`${postings.occurredOn} >= ${first}`.mapWith(String).as("late"),
      amountMinor: sql<number>`sum(${postings.amountMinor})`.mapWith(minorOf),
    })
    .from(postings)
    .where(
      and(
        eq(postings.outfitId, outfitId),
        inArray(postings.account, ["scrap-sales", "cost-of-scrap-sold"]),
        gte(postings.occurredOn, monthBounds(before).first),
        lte(postings.occurredOn, monthBounds(month).last),
      ),
    )
    .groupBy(postings.account, postings.gradeId, sql`late`);

/** Weight sold by grade over both months. */
const soldOfMonths = (db: Reader, { outfitId, first, before, month }: Months) =>
  db
    .select({
      gradeId: movementLines.gradeId,
      late: sql<string>`${movementLines.occurredOn} >= ${first}`.mapWith(String).as("late"),
      quantity: sql<DecimalString>`sum(${movementLines.quantity})`,
    })
    .from(movementLines)
    .where(
      and(
        eq(movementLines.outfitId, outfitId),
        eq(movementLines.place, "sold"),
        gte(movementLines.occurredOn, monthBounds(before).first),
        lte(movementLines.occurredOn, monthBounds(month).last),
      ),
    )
    .groupBy(movementLines.gradeId, sql`late`);

async function gradesOfMonths(db: Reader, scope: Months) {
  const grouped = { now: new Map<string, GradeMonth>(), before: new Map<string, GradeMonth>() };
  const of = (late: string) => (late === "1" ? grouped.now : grouped.before);
  const [money, weight] = await Promise.all([postingsOfMonths(db, scope), soldOfMonths(db, scope)]);
  for (const { account, gradeId, late, amountMinor } of money) {
    if (gradeId !== null) addToGrade(of(late), gradeId, account === "scrap-sales" ? { salesMinor: 0 - amountMinor } : { costMinor: amountMinor });
  }
  for (const { gradeId, late, quantity } of weight) if (gradeId !== null) addToGrade(of(late), gradeId, { quantity });
  return grouped;
}

async function pickupsOf(db: Reader, { outfitId, month }: Months): Promise<number> {
  const { first, last } = monthBounds(month);
  const [row] = await db
    .select({ n: count() })
    .from(pickups)
    .where(and(eq(pickups.outfitId, outfitId), gte(pickups.pickedUpOn, first), lte(pickups.pickedUpOn, last), ne(pickups.state, "void")));
  return row?.n ?? 0;
}

/** The review of a month against the month before. Six short reads, whatever the size of the books. */
export async function earningsOfMonth(db: Reader, { outfitId, month, exponent }: { outfitId: string; month: string; exponent: number }): Promise<Earnings> {
  const before = shiftMonth(month, -1);
  const scope: Months = { outfitId, month, before, first: `${month}-01` };
  const [accountRows, grouped, pickupCount, state, gradeRows] = await Promise.all([
    accountsOfMonths(db, scope),
    gradesOfMonths(db, scope),
    pickupsOf(db, scope),
    getMonth(db, { outfitId, month }),
    db.select({ id: grades.id, name: grades.name, family: grades.family }).from(grades).where(eq(grades.outfitId, outfitId)),
  ]);
  const accountsOf = (of: string) => accountRows.filter((row) => row.month === of);
  return earningsOf({
    now: { month, accounts: accountsOf(month), grades: grouped.now },
    before: { month: before, accounts: accountsOf(before), grades: grouped.before },
    names: new Map(gradeRows.map((grade) => [grade.id, grade])),
    exponent,
    pickups: pickupCount,
    closedAt: state.closedAt,
  });
}

/** A month and whether it is closed. A month that was never closed is open. */
export async function getMonth(db: Reader, { outfitId, month }: { outfitId: string; month: string }): Promise<Month> {
  const [row] = await db
    .select({ closedAt: months.closedAt, reopenedAt: months.reopenedAt, closerId: months.closedBy, closerName: users.name })
    .from(months)
    .leftJoin(memberships, and(eq(memberships.outfitId, months.outfitId), eq(memberships.id, months.closedBy)))
    .leftJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(months.outfitId, outfitId), eq(months.month, month)));
  return {
    month,
    closedAt: row?.closedAt?.toISOString() ?? null,
    closedBy: row?.closedAt != null && row.closerId !== null ? { id: row.closerId, name: row.closerName ?? "" } : null,
    reopenedAt: row?.reopenedAt?.toISOString() ?? null,
  };
}
