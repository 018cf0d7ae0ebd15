import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { StatusWord } from "@/components/ui/status-word";
import { formatDate, formatMoney, formatMoneyPlain } from "@/lib/format";
import type { Cost } from "@/lib/money/schema";
import { VoidCost } from "./void-cost";
import { COST_NAME, PAID_FROM_NAME } from "./words";

interface CostTableProps {
  slug: string;
  costs: Cost[];
  currency: string;
  today: string;
}

/** Costs, newest first, each of which can be taken back. */
export function CostTable({ slug, costs, currency, today }: CostTableProps) {
  return (
    <LedgerTable caption="Costs, newest first" rows="roomy">
      <thead>
        <tr>
          <Th>Day</Th>
          <Th>Kind</Th>
          <Th numeric unit={currency}>
            Amount
          </Th>
          <Th>Paid from</Th>
          <Th>Note</Th>
          <Th>Who</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {costs.map((cost) => (
          <tr key={cost.id}>
            <RowHead className="n">{formatDate(cost.spentOn, { today })}</RowHead>
            <Td>{COST_NAME[cost.kind]}</Td>
            <Td numeric>{cost.voidedAt === null ? formatMoneyPlain(cost.amountMinor, currency) : <s>{formatMoneyPlain(cost.amountMinor, currency)}</s>}</Td>
            <Td>{PAID_FROM_NAME[cost.paidFrom]}</Td>
            <Td className="wrap">{cost.note ?? ""}</Td>
            <Td>{cost.madeBy.name}</Td>
            <Td>
              {cost.voidedAt === null ? (
                <VoidCost slug={slug} id={cost.id} about={`${COST_NAME[cost.kind]}, ${formatMoney(cost.amountMinor, currency)}`} />
              ) : (
                <StatusWord tone="quiet">Void</StatusWord>
              )}
            </Td>
          </tr>
        ))}
      </tbody>
    </LedgerTable>
  );
}
