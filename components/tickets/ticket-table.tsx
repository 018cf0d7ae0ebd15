import Link from "next/link";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { StatusWord } from "@/components/ui/status-word";
import { daysBetween } from "@/lib/clock";
import { formatAge, formatDate, formatMoneyPlain, formatWeight } from "@/lib/format";
import type { TicketHead } from "@/lib/tickets/schema";
import { stateWords } from "./words";

type Props = { slug: string; tickets: TicketHead[]; unit: string; currency: string; today: string; money: boolean };

/** Sale tickets as a ruled list. */
export function TicketTable({ slug, tickets, unit, currency, today, money }: Props) {
  return (
    <LedgerTable caption="Sale tickets, newest first" rows="roomy">
      <thead>
        <tr>
          <Th>Ticket</Th>
          <Th>Yard</Th>
          <Th>Weighed</Th>
          <Th numeric>Lines</Th>
          <Th numeric unit={unit}>
            Net
          </Th>
          {money ? (
            <>
              <Th numeric unit={currency}>
                Total
              </Th>
              <Th numeric unit={currency}>
                Left to pay
              </Th>
            </>
          ) : null}
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {tickets.map((ticket) => (
          <tr key={ticket.id}>
            <RowHead>
              <Link href={`/o/${slug}/tickets/${ticket.id}`}>{ticket.number}</Link>
            </RowHead>
            <Td>{ticket.yardName}</Td>
            <Td className="n">{formatDate(ticket.ticketOn, { today })}</Td>
            <Td numeric>{ticket.lineCount}</Td>
            <Td numeric>{formatWeight(ticket.quantity)}</Td>
            {money ? (
              <>
                <Td numeric>{ticket.totalMinor === null ? "" : formatMoneyPlain(ticket.totalMinor, currency)}</Td>
                <Td numeric>{ticket.leftMinor ? <b>{formatMoneyPlain(ticket.leftMinor, currency)}</b> : ""}</Td>
              </>
            ) : null}
            <Td>
              <StatusWord>
                {stateWords(ticket.state)}
                {ticket.state === "posted" ? `, ${formatAge(daysBetween(ticket.ticketOn, today))}` : ""}
              </StatusWord>
            </Td>
          </tr>
        ))}
      </tbody>
    </LedgerTable>
  );
}
