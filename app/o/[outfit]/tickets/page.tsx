import type { Metadata } from "next";
import { TicketFilters } from "@/components/tickets/ticket-filters";
import { TicketTable } from "@/components/tickets/ticket-table";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesTicketMoney } from "@/lib/auth/permissions";
import { AppError } from "@/lib/http/errors";
import { ticketListQuery } from "@/lib/tickets/schema";
import { seeTickets } from "@/lib/tickets/service";

export const metadata: Metadata = { title: "Tickets" };

type Search = Record<string, string | string[] | undefined>;

/** The yards' papers, newest first. */
export default async function TicketsPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "tickets.see");
  const search = await searchParams;
  const asked = Object.fromEntries(["state", "yardId", "from", "to", "cursor"].flatMap((name) => (search[name] ? [[name, search[name]]] : [])));
  const parsed = ticketListQuery.safeParse(asked);
  const query = parsed.success ? parsed.data : ticketListQuery.parse({});
  const page = await seeTickets(ctx, query).catch((error: unknown) => {
    // A cursor that was cut short in copying is no reason for an error page.
    if (error instanceof AppError && error.code === "input") return null;
    throw error;
  });
  const record = can(ctx.actor.role, "tickets.draft") ? <Button href={`/o/${slug}/tickets/new`}>Record a ticket</Button> : null;
  const older = new URLSearchParams({ ...(query.state ? { state: query.state } : {}), cursor: page?.nextCursor ?? "" });
  return (
    <div className="page">
      <PageHead title="Tickets" fact="The yards’ papers, and what is still owed on them." actions={record} />
      <TicketFilters slug={slug} state={query.state ?? "all"} />
      <Panel>
        {page === null || page.items.length === 0 ? (
          <EmptyState title={query.state === undefined ? "No tickets yet" : "No tickets like that"} actions={record}>
            {query.state === undefined ? "When a yard weighs your metal, copy its paper here. Each sum is checked as you type." : "Choose another state above."}
          </EmptyState>
        ) : (
          <TicketTable
            slug={slug}
            tickets={page.items}
            unit={ctx.outfit.weightUnit}
            currency={ctx.outfit.currency}
            today={ctx.today}
            money={seesTicketMoney(ctx.actor.role, ctx.outfit.hidesMoney)}
          />
        )}
      </Panel>
      {page?.nextCursor ? (
        <div>
          <Button variant="line" href={`/o/${slug}/tickets?${older.toString()}`}>
            Older tickets
          </Button>
        </div>
      ) : null}
    </div>
  );
}
