import type { Metadata } from "next";
import { notFound, redirect } from "next/navigation";
import { TicketForm } from "@/components/tickets/ticket-form";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { typedFrom } from "@/lib/tickets/paper";
import { findTicket, ticketChoices } from "@/lib/tickets/pages";

export const metadata: Metadata = { title: "Change draft" };

/** Typing a draft again. */
export default async function EditTicketPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "tickets.draft");
  const [ticket, choices] = await Promise.all([findTicket(ctx, id), ticketChoices(ctx)]);
  if (!ticket) notFound();
  if (ticket.state !== "draft") redirect(`/o/${slug}/tickets/${id}`);
  const { weightUnit, currency, exponent } = ctx.outfit;
  const money = { weightUnit, currency, exponent };
  return (
    <div className="page">
      <TicketForm
        slug={slug}
        outfit={money}
        today={ctx.today}
        choices={choices}
        start={typedFrom(ticket, money)}
        kept={{ id: ticket.id, version: ticket.version }}
        mayPost={can(ctx.actor.role, "tickets.post")}
      />
    </div>
  );
}
