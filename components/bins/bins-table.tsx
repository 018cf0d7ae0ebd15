"use client";

import { useTable } from "@tanstack/react-table";
import { useMemo } from "react";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { sum } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import type { BinsRow } from "@/lib/bins/pages";
import { formatMoneyPlain, formatWeight } from "@/lib/format";
import { columnsFor, features } from "./bins-columns";

type Props = { slug: string; rows: BinsRow[]; unit: string; currency: string; chosen: string | null; cost: boolean; prices: boolean };

const LEFT = new Set(["name", "yard", "sellPoint"]);
// Names sort from A first, figures from the largest.
const NAMES = new Set(["name", "yard"]);
const DIRECTIONS = { asc: "ascending", desc: "descending" } as const;

/** What is held by grade, with totals; a press on a head sorts by it, and a grade opens beside the table. */
export function BinsTable({ slug, rows, unit, currency, chosen, cost, prices }: Props) {
  const data = useMemo(() => rows.map((row) => ({ ...row, slug, currency })), [rows, slug, currency]);
  const columns = useMemo(() => columnsFor({ cost, prices }), [cost, prices]);
  const table = useTable({ features, columns, data });
  const units: Record<string, string> = { quantity: unit, cost: `${currency}/${unit}`, price: `${currency}/${unit}`, value: currency, sellPoint: unit };
  const totals: Record<string, string> = {
    quantity: formatWeight(sum(rows.map((row) => row.quantity))),
    value: formatMoneyPlain(addMinor(...rows.map((row) => row.valueMinor ?? 0)), currency),
  };
  const ripe = rows.filter((row) => (row.percent ?? 0) >= 100).length;
  return (
    <LedgerTable caption="What the bins hold, by grade, with totals. The heads sort." rows="roomy" className="by-grade">
      <thead>
        {table.getHeaderGroups().map((group) => (
          <tr key={group.id}>
            {group.headers.map((header) => {
              const sorted = header.column.getIsSorted();
              return (
                <Th
                  key={header.id}
                  numeric={!LEFT.has(header.column.id)}
                  unit={units[header.column.id]}
                  sort={{
                    direction: sorted === false ? "none" : DIRECTIONS[sorted],
                    onSort: () => header.column.toggleSorting(NAMES.has(header.column.id) ? sorted === "asc" : sorted !== "desc"),
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
          <tr key={row.original.gradeId} className={row.original.gradeId === chosen ? "chosen" : undefined}>
            {row.getAllCells().map((cell) =>
              cell.column.id === "name" ? (
                <RowHead key={cell.id}>
                  <table.FlexRender cell={cell} />
                </RowHead>
              ) : (
                <Td key={cell.id} numeric={!LEFT.has(cell.column.id)}>
                  <table.FlexRender cell={cell} />
                </Td>
              ),
            )}
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          {table.getHeaderGroups()[0]?.headers.map((header) => {
            const { id } = header.column;
            if (id === "name") return <RowHead key={id}>All bins</RowHead>;
            if (id === "bins")
              return (
                <Td key={id} numeric>
                  {String(rows.reduce((total, row) => total + row.bins, 0))}
                </Td>
              );
            if (id === "sellPoint") return <Td key={id}>{`${ripe} of ${rows.length} at the sell point`}</Td>;
            const total = totals[id];
            return (
              <Td key={id} numeric>
                {total === undefined ? null : <Sum>{total}</Sum>}
              </Td>
            );
          })}
        </tr>
      </tfoot>
    </LedgerTable>
  );
}
