import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { PaymentForm } from "@/components/tickets/payment-form";
import { TicketActions } from "@/components/tickets/ticket-actions";
import { TicketPayments } from "@/components/tickets/ticket-payments";
import { TicketRecord } from "@/components/tickets/ticket-record";
import { TicketVerdict } from "@/components/tickets/ticket-verdict";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesTicketMoney } from "@/lib/auth/permissions";
import { formatDate } from "@/lib/format";
import { checkTicket } from "@/lib/tickets/check";
import { findTicket } from "@/lib/tickets/pages";

export const metadata: Metadata = { title: "Sale ticket" };

/** One sale ticket: the paper, our check of it, what was paid, and what can be done. */
export default async function TicketPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "tickets.see");
  const { role } = ctx.actor;
  const { weightUnit, currency, exponent } = ctx.outfit;
  const ticket = await findTicket(ctx, id);
  if (!ticket) notFound();
  const money = seesTicketMoney(role, ctx.outfit.hidesMoney);
  const check = money ? await checkTicket(ctx, id) : null;
  const outfit = { weightUnit, currency, exponent };
  return (
    <div className="page aside">
      <div className="full">
        <PageHead
          title={`Ticket ${ticket.number}`}
          fact={`${ticket.yardName}, weighed ${formatDate(ticket.ticketOn, { today: ctx.today })}. Entered by ${ticket.madeBy.name}.`}
        />
      </div>
      <TicketRecord ticket={ticket} outfit={outfit} today={ctx.today} money={money} />
      <div className="grid content-start gap-4">
        <TicketActions
          slug={slug}
          id={ticket.id}
          number={ticket.number}
          state={ticket.state}
          mayPost={can(role, "tickets.post")}
          mayVoid={can(role, "tickets.void")}
          mayChange={can(role, "tickets.draft")}
        />
        {check ? <TicketVerdict check={check} currency={currency} /> : null}
        {money ? <TicketPayments slug={slug} ticket={ticket} currency={currency} today={ctx.today} seesBooks={can(role, "books.see")} /> : null}
        {ticket.state === "posted" && can(role, "tickets.pay") ? (
          <Panel title="Record a payment" padded>
            <PaymentForm slug={slug} ticketId={ticket.id} outfit={outfit} leftMinor={ticket.leftMinor ?? 0} today={ctx.today} method={ticket.paymentMethod} />
          </Panel>
        ) : null}
      </div>
    </div>
  );
}
