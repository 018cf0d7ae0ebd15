import { Sum } from "@/components/ui/ledger-table";
import { formatMoneyPlain, formatWeight } from "@/lib/format";
import type { Money, ReadTicket } from "@/lib/tickets/paper";

/** Column totals under the lines of a ticket. */
export function TicketLineTotals({ read, outfit }: { read: ReadTicket; outfit: Money }) {
  const totals = [
    ["Gross", formatWeight(read.gross), outfit.weightUnit],
    ["Tare", formatWeight(read.tare), outfit.weightUnit],
    ["Deduct", formatWeight(read.deduction), outfit.weightUnit],
    ["Net", formatWeight(read.net), outfit.weightUnit],
    ["Amount", formatMoneyPlain(read.amountMinor, outfit.currency), outfit.currency],
  ] as const;
  return (
    <dl className="tk-totals">
      {totals.map(([name, figure, unit]) => (
        <div key={name}>
          <dt>
            {name}, {unit}
          </dt>
          <dd>
            <Sum>{figure}</Sum>
          </dd>
        </div>
      ))}
    </dl>
  );
}
