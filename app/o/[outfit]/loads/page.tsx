import type { Metadata } from "next";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContext } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";

export const metadata: Metadata = { title: "Loads" };

/** Loads: metal is sold straight out of the bins, so the page leads to the ticket and to what is ripe. */
export default async function LoadsPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContext(slug);
  const actions = (
    <>
      {can(ctx.actor.role, "tickets.draft") ? <Button href={`/o/${slug}/tickets/new`}>Record a ticket</Button> : null}
      <Button variant="line" href={`/o/${slug}/bins`}>
        See the bins
      </Button>
    </>
  );
  return (
    <div className="page">
      <PageHead title="Loads" fact="What goes on the truck for one run." />
      <Panel>
        <EmptyState title="Nothing on the truck" actions={actions}>
          Metal is sold straight from the bins: take it to the yard, then record the yard’s ticket. Each line says which bin it came out of.
        </EmptyState>
      </Panel>
    </div>
  );
}
