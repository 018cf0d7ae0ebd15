import { createColumnHelper, createSortedRowModel, rowSortingFeature, tableFeatures } from "@tanstack/react-table";
import type { ReactNode } from "react";
import { hatchClass } from "@/components/ui/families";
import { StatusWord } from "@/components/ui/status-word";
import { GradeTag } from "@/components/ui/tag";
import { compare, roundTo, type DecimalString } from "@/lib/arithmetic/decimal";
import type { BinsRow } from "@/lib/bins/pages";
import { formatAge, formatMoneyPlain, formatPrice, formatWeight } from "@/lib/format";

/** A grade's row with what its cells need to know. */
export type BinsTableRow = BinsRow & { slug: string; currency: string };

export const features = tableFeatures({ rowSortingFeature, sortedRowModel: createSortedRowModel() });
const helper = createColumnHelper<typeof features, BinsTableRow>();

type Value = (row: BinsTableRow) => DecimalString | number | null;

/** Two values in order; what is missing stands below everything. */
function inOrder(a: ReturnType<Value>, b: ReturnType<Value>): number {
  if (a === null || b === null) return a === b ? 0 : a === null ? -1 : 1;
  return compare(String(a), String(b));
}

const numeric = (id: string, header: string, value: Value, cell: (row: BinsTableRow) => ReactNode) =>
  helper.accessor((row) => value(row), {
    id,
    header,
    sortFn: (a, b) => inOrder(value(a.original), value(b.original)),
    cell: ({ row }) => cell(row.original),
  });

function SellPoint({ row }: { row: BinsTableRow }) {
  if (row.percent === null) return null;
  return (
    <span className="n">
      <span className="sell-bar" aria-hidden="true">
        <i className={`hatch ${hatchClass(row.family)}`} style={{ width: `${Math.min(row.percent, 100)}%` }} />
      </span>{" "}
      <b>{row.percent}%</b> <small className="mut">of {formatWeight(row.sellPoint, { places: 0 })}</small>
    </span>
  );
}

const grade = helper.accessor("name", {
  header: "Grade",
  sortFn: (a, b) => a.original.name.localeCompare(b.original.name, "en-US"),
  cell: ({ row }) => (
    <GradeTag as="link" href={`/o/${row.original.slug}/bins?grade=${row.original.gradeId}`} family={row.original.family} name={row.original.name} />
  ),
});

const yard = helper.accessor((row) => row.best?.yardName ?? "", {
  id: "yard",
  header: "Yard",
  sortFn: (a, b) => (a.original.best?.yardName ?? "").localeCompare(b.original.best?.yardName ?? "", "en-US"),
  cell: ({ row }) =>
    row.original.best ? (
      <>
        {row.original.best.yardName}{" "}
        {row.original.best.stale ? (
          <StatusWord boxed>
            <span className="vh">stale, </span>
            {formatAge(row.original.best.ageDays)}
          </StatusWord>
        ) : null}
      </>
    ) : (
      ""
    ),
});

/** The columns of the bins page, fewer for those who see no cost or no prices. */
export function columnsFor({ cost, prices }: { cost: boolean; prices: boolean }) {
  return helper.columns([
    grade,
    numeric(
      "quantity",
      "Weight",
      (row) => row.quantity,
      (row) => <b>{formatWeight(row.quantity)}</b>,
    ),
    numeric(
      "bins",
      "Bins",
      (row) => row.bins,
      (row) => row.bins,
    ),
    ...(cost
      ? [
          numeric(
            "cost",
            "Avg cost",
            (row) => row.averageCost,
            (row) => (row.averageCost === null ? "–" : formatWeight(roundTo(row.averageCost, 2), { places: 2 })),
          ),
        ]
      : []),
    ...(prices
      ? [
          numeric(
            "price",
            "Best price",
            (row) => row.best?.price ?? null,
            (row) => (row.best ? formatPrice(row.best.price) : "–"),
          ),
          yard,
          numeric(
            "value",
            "Value",
            (row) => row.valueMinor,
            (row) => (row.valueMinor === null ? "–" : <b>{formatMoneyPlain(row.valueMinor, row.currency)}</b>),
          ),
        ]
      : []),
    numeric(
      "days",
      "Days held",
      (row) => row.daysHeld,
      (row) => row.daysHeld ?? "",
    ),
    numeric(
      "sellPoint",
      "Towards sell point",
      (row) => row.percent,
      (row) => <SellPoint row={row} />,
    ),
  ]);
}
