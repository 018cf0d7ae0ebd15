import type { Metadata } from "next";
import { TicketForm } from "@/components/tickets/ticket-form";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { ticketChoices } from "@/lib/tickets/pages";
import { emptyLine } from "@/lib/tickets/paper";

export const metadata: Metadata = { title: "New sale ticket" };

/** Copying a yard's paper. */
export default async function NewTicketPage({
  params,
  searchParams,
}: {
  params: Promise<{ outfit: string }>;
  searchParams: Promise<{ yard?: string | string[] }>;
}) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "tickets.draft");
  const choices = await ticketChoices(ctx);
  const { yard } = await searchParams;
  const { weightUnit, currency, exponent } = ctx.outfit;
  if (choices.yards.length === 0) {
    const add = can(ctx.actor.role, "yards.change") ? <Button href={`/o/${slug}/prices/yards/new`}>Add a yard</Button> : null;
    return (
      <div className="page">
        <PageHead title="Sale ticket" />
        <Panel>
          <EmptyState title="No yards yet" actions={add}>
            A ticket belongs to a yard. Add the yard that wrote it first.
          </EmptyState>
        </Panel>
      </div>
    );
  }
  const yardId = choices.yards.find((one) => one.id === yard)?.id ?? (choices.yards.length === 1 ? (choices.yards[0]?.id ?? "") : "");
  const start = {
    yardId,
    number: "",
    ticketOn: ctx.today,
    paymentMethod: "",
    tax: "",
    fee: "",
    total: "",
    note: "",
    paperSaysSo: false,
    lines: [{ ...emptyLine(), per: weightUnit }],
  };
  return (
    <div className="page">
      <TicketForm
        slug={slug}
        outfit={{ weightUnit, currency, exponent }}
        today={ctx.today}
        choices={choices}
        start={start}
        kept={null}
        mayPost={can(ctx.actor.role, "tickets.post")}
      />
    </div>
  );
}
