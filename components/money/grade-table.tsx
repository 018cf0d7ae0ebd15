"use client";

import { useTable } from "@tanstack/react-table";
import { useMemo } from "react";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { sum } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import { formatMoneyPlain, formatPercent, formatWeight } from "@/lib/format";
import type { GradeEarnings } from "@/lib/money/schema";
import { averageWords, columns, features, marginShare, rowsOf } from "./grade-columns";

interface GradeTableProps {
  slug: string;
  month: string;
  grades: GradeEarnings[];
  unit: string;
  currency: string;
  /** The sign the heads carry: "$". */
  sign: string;
  /** All sales by all weight, as a price; null when nothing was sold. */
  averagePrice: string | null;
}

const directions = { asc: "ascending", desc: "descending" } as const;

/** The month's grades with totals; a press on a head sorts by it, and each figure leads to the records behind it. */
export function GradeTable({ slug, month, grades, unit, currency, sign, averagePrice }: GradeTableProps) {
  const data = useMemo(() => rowsOf(grades, { slug, month, currency }), [grades, slug, month, currency]);
  const table = useTable({ features, columns, data, initialState: { sorting: [{ id: "margin", desc: true }] } });
  const units: Record<string, string> = {
    quantity: unit,
    sales: sign,
    price: `${sign}/${unit}`,
    change: `${sign}/${unit}`,
    cost: sign,
    margin: sign,
    percent: "%",
    share: "%",
  };
  const totals = { salesMinor: addMinor(...grades.map((one) => one.salesMinor)), marginMinor: addMinor(...grades.map((one) => one.marginMinor)) };
  const share = marginShare(totals);
  const money = (minor: number) => <Sum>{formatMoneyPlain(minor, currency)}</Sum>;
  return (
    <LedgerTable caption="Grades sold in the month, with totals. The heads sort." rows="plain">
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => {
              const sorted = header.column.getIsSorted();
              return (
                <Th
                  key={header.id}
                  numeric={header.column.id !== "gradeName" && header.column.id !== "share"}
                  unit={units[header.column.id]}
                  sort={{
                    direction: sorted === false ? "none" : directions[sorted],
                    onSort: () => header.column.toggleSorting(header.column.id === "gradeName" ? sorted === "asc" : sorted !== "desc"),
                  }}
                >
                  <table.FlexRender header={header} />
                </Th>
              );
            })}
          </tr>
        ))}
      </thead>
      <tbody>
        {table.getRowModel().rows.map((row) => (
          <tr key={row.original.gradeId}>
            {row.getAllCells().map((cell) =>
              cell.column.id === "gradeName" ? (
                <RowHead key={cell.id}>
                  <table.FlexRender cell={cell} />
                </RowHead>
              ) : (
                <Td key={cell.id} numeric={cell.column.id !== "share"} muted={cell.column.id === "change"}>
                  <table.FlexRender cell={cell} />
                </Td>
              ),
            )}
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <RowHead>{grades.length === 1 ? "1 grade" : `${grades.length} grades`}</RowHead>
          <Td numeric>
            <Sum>{formatWeight(sum(grades.map((one) => one.quantity)))}</Sum>
          </Td>
          <Td numeric>{money(totals.salesMinor)}</Td>
          <Td numeric>{averageWords(averagePrice)}</Td>
          <Td />
          <Td numeric>{money(addMinor(...grades.map((one) => one.costMinor)))}</Td>
          <Td numeric>{money(totals.marginMinor)}</Td>
          <Td numeric>{share === null ? "–" : formatPercent(share).replace("%", "")}</Td>
          <Td />
        </tr>
      </tfoot>
    </LedgerTable>
  );
}
