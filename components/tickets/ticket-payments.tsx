import Link from "next/link";
import { Panel } from "@/components/ui/panel";
import { formatDate, formatMoney } from "@/lib/format";
import type { Ticket } from "@/lib/tickets/schema";
import { METHOD_WORDS } from "./words";

type Props = { slug: string; ticket: Ticket; currency: string; today: string; seesBooks: boolean };

/** What the yard paid on a ticket and what is left, with the way to the entries behind it. */
export function TicketPayments({ slug, ticket, currency, today, seesBooks }: Props) {
  const left = ticket.leftMinor ?? 0;
  const end = seesBooks ? (
    <Link className="link" href={`/o/${slug}/money/entries?ticketId=${ticket.id}`}>
      Entries
    </Link>
  ) : null;
  return (
    <Panel title="Paid" sub={ticket.state === "draft" ? "not posted yet" : undefined} end={end} padded>
      {ticket.payments.length === 0 ? <p>Nothing paid yet.</p> : null}
      <ul className="grid gap-2">
        {ticket.payments.map((payment) => (
          <li key={payment.id} className="flex justify-between gap-3">
            <span>
              {formatDate(payment.paidOn, { today })}, {METHOD_WORDS[payment.method]}
              {payment.voidedAt ? ", taken back" : ""}
            </span>
            <b className="n">{formatMoney(payment.amountMinor ?? 0, currency)}</b>
          </li>
        ))}
      </ul>
      {ticket.state === "posted" ? (
        <p className="mt-2 flex justify-between gap-3">
          <span>Left to pay</span>
          <b className="n">{formatMoney(left, currency)}</b>
        </p>
      ) : null}
    </Panel>
  );
}
