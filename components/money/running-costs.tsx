import Link from "next/link";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import { formatMoneyPlain } from "@/lib/format";
import type { Earnings } from "@/lib/money/schema";

/** The month's running costs by kind, each with the way to its entries. */
export function RunningCosts({ slug, earnings, currency }: { slug: string; earnings: Earnings; currency: string }) {
  const { costsByKind, costsMinor, month } = earnings;
  const add = (
    <Link className="link" href={`/o/${slug}/money/costs/new`}>
      Add cost
    </Link>
  );
  if (costsByKind.length === 0)
    return (
      <Panel title="Running costs" end={add}>
        <p className="in mut">None in this month.</p>
      </Panel>
    );
  return (
    <Panel title="Running costs" end={add}>
      <LedgerTable caption="Running costs by kind" rows="mini">
        <thead>
          <tr>
            <Th>Kind</Th>
            <Th numeric unit={currency}>
              Amount
            </Th>
          </tr>
        </thead>
        <tbody>
          {costsByKind.map((cost) => (
            <tr key={cost.account}>
              <RowHead>{cost.name}</RowHead>
              <Td numeric>
                <Link href={`/o/${slug}/money/entries?month=${month}&account=${cost.account}`}>{formatMoneyPlain(cost.amountMinor, currency)}</Link>
              </Td>
            </tr>
          ))}
        </tbody>
        <tfoot>
          <tr>
            <RowHead>{costsByKind.length === 1 ? "1 kind" : `${costsByKind.length} kinds`}</RowHead>
            <Td numeric>
              <Sum>{formatMoneyPlain(costsMinor, currency)}</Sum>
            </Td>
          </tr>
        </tfoot>
      </LedgerTable>
    </Panel>
  );
}
