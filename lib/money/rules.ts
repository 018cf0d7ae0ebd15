import { add, divide, isPositive, isZero, sum, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import { addMinor, decimalFromMinor, minorFromDecimal } from "@/lib/arithmetic/money";
import { readNumber } from "@/lib/arithmetic/read-number";
import { whyItChanged, type SalesByGrade } from "@/lib/arithmetic/why";
import { PAYING_ACCOUNT } from "@/lib/books/accounts";
import type { Posting } from "@/lib/books/booking";
import type { CostInput, Earnings, GradeEarnings } from "./schema";

/** A cost in the money book: its kind is its account. Own-pocket money is owed back to the member. */
export function costPostings(cost: Pick<CostInput, "kind" | "amountMinor" | "paidFrom">, memberId: string): Posting[] {
  const payer = cost.paidFrom === "own-pocket" ? { memberId } : {};
  return [
    { account: cost.kind, amountMinor: cost.amountMinor },
    { account: PAYING_ACCOUNT[cost.paidFrom], amountMinor: 0 - cost.amountMinor, ...payer },
  ];
}

/** What the books have of one grade in one month: sales and cost positive, weight as sold. */
export type GradeMonth = { quantity: DecimalString; salesMinor: number; costMinor: number };

/** Totals of a month's income and expense accounts as posted: income is negative. */
export type AccountMonth = { account: string; name: string; kind: "income" | "expense"; amountMinor: number };

export type MonthFigures = { month: string; accounts: AccountMonth[]; grades: Map<string, GradeMonth> };

/** Expenses that the review shows by themselves and not among the running costs. */
const NOT_RUNNING = new Set(["cost-of-scrap-sold", "stock-loss", "rounding"]);

/** Money per weight unit; null when there is no weight to divide by. */
export const averagePriceOf = ({ quantity, salesMinor }: Pick<GradeMonth, "quantity" | "salesMinor">, exponent: number): DecimalString | null =>
  isPositive(quantity) ? divide(decimalFromMinor(salesMinor, exponent), quantity, 6) : null;

const amountOf = (figures: MonthFigures, account: string): number => figures.accounts.find((one) => one.account === account)?.amountMinor ?? 0;

const runningCosts = (figures: MonthFigures): AccountMonth[] => figures.accounts.filter((one) => one.kind === "expense" && !NOT_RUNNING.has(one.account));

const isNothing = (grade: GradeMonth): boolean => isZero(grade.quantity) && grade.salesMinor === 0 && grade.costMinor === 0;

/** A month's headline figures. Net is what all income and expense accounts come to, so it leaves nothing out. */
function totalsOf(figures: MonthFigures) {
  return {
    month: figures.month,
    netMinor: 0 - addMinor(...figures.accounts.map((one) => one.amountMinor)),
    salesMinor: 0 - amountOf(figures, "scrap-sales"),
    quantity: trim(sum([...figures.grades.values()].map((grade) => grade.quantity))),
    costOfScrapMinor: amountOf(figures, "cost-of-scrap-sold"),
    costsMinor: addMinor(...runningCosts(figures).map((one) => one.amountMinor)),
  };
}

const salesOf = (figures: MonthFigures): SalesByGrade =>
  Object.fromEntries([...figures.grades].map(([gradeId, { quantity, salesMinor }]) => [gradeId, { quantity, salesMinor }]));

function byGrade(now: MonthFigures, before: MonthFigures, names: Map<string, { name: string; family: string }>, exponent: number): GradeEarnings[] {
  return [...now.grades]
    .filter(([, grade]) => !isNothing(grade))
    .map(([gradeId, grade]) => {
      const earlier = before.grades.get(gradeId);
      const sold = earlier !== undefined && (earlier.salesMinor !== 0 || !isZero(earlier.quantity)) ? earlier : null;
      return {
        gradeId,
        gradeName: names.get(gradeId)?.name ?? "",
        family: names.get(gradeId)?.family ?? "other",
        quantity: trim(grade.quantity),
        salesMinor: grade.salesMinor,
        costMinor: grade.costMinor,
        marginMinor: addMinor(grade.salesMinor, -grade.costMinor),
        averagePrice: averagePriceOf(grade, exponent),
        before: sold && { quantity: trim(sold.quantity), salesMinor: sold.salesMinor, averagePrice: averagePriceOf(sold, exponent) },
      };
    })
    .sort((a, b) => b.marginMinor - a.marginMinor || (a.gradeName < b.gradeName ? -1 : 1));
}

/** The month's review out of its figures and those of the month before. Amounts in minor units, `exponent` the currency's. */
export function earningsOf(input: {
  now: MonthFigures;
  before: MonthFigures;
  names: Map<string, { name: string; family: string }>;
  exponent: number;
  pickups: number;
  closedAt: string | null;
}): Earnings {
  const { now, before, names, exponent, pickups, closedAt } = input;
  const earlier = totalsOf(before);
  return {
    ...totalsOf(now),
    closedAt,
    byGrade: byGrade(now, before, names, exponent),
    costsByKind: runningCosts(now)
      .filter((one) => one.amountMinor !== 0)
      .map(({ account, name, amountMinor }) => ({ account, name, amountMinor })),
    haulAwayFeesMinor: 0 - amountOf(now, "haul-away-fees"),
    stockLossMinor: amountOf(now, "stock-loss"),
    roundingMinor: amountOf(now, "rounding"),
    pickups,
    why: whyItChanged(salesOf(before), salesOf(now)),
    before: earlier,
  };
}

/** Adds what one row says of a grade to what is known of it. */
export function addToGrade(grades: Map<string, GradeMonth>, gradeId: string, more: Partial<GradeMonth>): void {
  const known = grades.get(gradeId) ?? { quantity: "0", salesMinor: 0, costMinor: 0 };
  grades.set(gradeId, {
    quantity: add(known.quantity, more.quantity ?? "0"),
    salesMinor: addMinor(known.salesMinor, more.salesMinor ?? 0),
    costMinor: addMinor(known.costMinor, more.costMinor ?? 0),
  });
}

/** What moved the net besides the price, volume and mix of sales, each with the sign it moved the net by; `other` is the rest. */
export function netEffects({ netMinor, costOfScrapMinor, costsMinor, why, before }: Earnings) {
  const changeMinor = addMinor(netMinor, -before.netMinor);
  const scrapMinor = addMinor(before.costOfScrapMinor, -costOfScrapMinor);
  const runningMinor = addMinor(before.costsMinor, -costsMinor);
  return { changeMinor, scrapMinor, runningMinor, otherMinor: addMinor(changeMinor, -why.changeMinor, -scrapMinor, -runningMinor) };
}

/** An amount as it is typed, in minor units; null when it is no amount of money that could be booked. */
export function readAmount(text: string, { exponent, currencySymbols }: { exponent: number; currencySymbols: string[] }): number | null {
  const read = readNumber(text, { locale: "en-US", currencySymbols });
  return read.ok && /^\d{1,11}(\.\d+)?$/.test(read.value) ? minorFromDecimal(read.value, exponent) : null;
}
