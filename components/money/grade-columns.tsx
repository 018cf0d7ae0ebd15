import { createColumnHelper, createSortedRowModel, rowSortingFeature, tableFeatures } from "@tanstack/react-table";
import Link from "next/link";
import type { ReactNode } from "react";
import { forDrawing, percent } from "@/components/ui/charts/numbers";
import { Hatch } from "@/components/ui/hatch";
import { GradeTag } from "@/components/ui/tag";
import { compare, divide, roundTo, subtract, type DecimalString } from "@/lib/arithmetic/decimal";
import { formatMoneyPlain, formatPercent, formatPrice, formatWeight } from "@/lib/format";
import type { GradeEarnings } from "@/lib/money/schema";

/** A grade's row with the way to its records and its part of the margin. */
export type GradeRow = GradeEarnings & {
  currency: string;
  entries: string;
  movements: string;
  /** Of all margin, as a fraction; null when there is none to share. */
  share: DecimalString | null;
  /** Against the largest share, for the bar. */
  long: number;
};

export const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel() });
const helper = createColumnHelper<typeof features, GradeRow>();

type Value = (row: GradeRow) => DecimalString | number | null;

/** Two values in order; what is missing stands below everything. */
function inOrder(a: ReturnType<Value>, b: ReturnType<Value>): number {
  if (a === null || b === null) return a === b ? 0 : a === null ? -1 : 1;
  return compare(String(a), String(b));
}

/** An average price written like a quoted one: cents, or a tenth of them below ten cents. */
export const averageWords = (price: DecimalString | null): string =>
  price === null ? "–" : formatPrice(roundTo(price, compare(price, "0.1") < 0 && compare(price, "-0.1") > 0 ? 3 : 2));

/** What was kept of each dollar of sales; null without sales. */
export const marginShare = ({ marginMinor, salesMinor }: Pick<GradeEarnings, "marginMinor" | "salesMinor">): DecimalString | null =>
  salesMinor === 0 ? null : divide(String(marginMinor), String(salesMinor), 6);

const priceChange = ({ averagePrice, before }: GradeRow): DecimalString | null =>
  averagePrice === null || before?.averagePrice == null ? null : subtract(averagePrice, before.averagePrice);

const percentWords = (fraction: DecimalString | null) => (fraction === null ? "–" : formatPercent(fraction).replace("%", ""));

const numeric = (id: string, header: string, value: Value, cell: (row: GradeRow) => ReactNode) =>
  helper.accessor((row) => value(row), {
    id,
    header,
    sortFn: (a, b) => inOrder(value(a.original), value(b.original)),
    cell: ({ row }) => cell(row.original),
  });

export const columns = helper.columns([
  helper.accessor("gradeName", {
    header: "Grade sold",
    sortFn: (a, b) => a.original.gradeName.localeCompare(b.original.gradeName, "en-US"),
    cell: ({ row }) => <GradeTag family={row.original.family} name={row.original.gradeName} />,
  }),
  numeric(
    "quantity",
    "Weight",
    (row) => row.quantity,
    (row) => <Link href={row.movements}>{formatWeight(row.quantity)}</Link>,
  ),
  numeric(
    "sales",
    "Sales",
    (row) => row.salesMinor,
    (row) => (
      <Link href={`${row.entries}&account=scrap-sales`}>
        <b>{formatMoneyPlain(row.salesMinor, row.currency)}</b>
      </Link>
    ),
  ),
  numeric(
    "price",
    "Avg price",
    (row) => row.averagePrice,
    (row) => averageWords(row.averagePrice),
  ),
  numeric("change", "Change", priceChange, (row) => {
    const change = priceChange(row);
    return change === null ? "new" : formatPrice(roundTo(change, 3), { sign: true });
  }),
  numeric(
    "cost",
    "Cost",
    (row) => row.costMinor,
    (row) => <Link href={`${row.entries}&account=cost-of-scrap-sold`}>{formatMoneyPlain(row.costMinor, row.currency)}</Link>,
  ),
  numeric(
    "margin",
    "Margin",
    (row) => row.marginMinor,
    (row) => <b>{formatMoneyPlain(row.marginMinor, row.currency)}</b>,
  ),
  numeric("percent", "Margin", marginShare, (row) => percentWords(marginShare(row))),
  numeric(
    "share",
    "Share of margin",
    (row) => row.share,
    (row) => (
      <span className="gb">
        <Hatch family={row.family} style={{ width: percent(row.long) }} />
        <span className="n">{percentWords(row.share)}</span>
      </span>
    ),
  ),
]);

/** Rows for the table out of the month's grades. */
export function rowsOf(grades: GradeEarnings[], { slug, month, currency }: { slug: string; month: string; currency: string }): GradeRow[] {
  const whole = grades.reduce((total, grade) => total + Math.max(grade.marginMinor, 0), 0);
  const most = Math.max(1, ...grades.map((grade) => grade.marginMinor));
  return grades.map((grade) => {
    const margin = Math.max(grade.marginMinor, 0);
    const about = `?month=${month}&gradeId=${grade.gradeId}`;
    return {
      ...grade,
      currency,
      entries: `/o/${slug}/money/entries${about}`,
      movements: `/o/${slug}/money/movements${about}&place=sold`,
      share: whole === 0 ? null : divide(String(margin), String(whole), 6),
      long: forDrawing(divide(String(margin), String(most), 6)),
    };
  });
}
