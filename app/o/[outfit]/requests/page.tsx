import type { Metadata } from "next";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContext } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";

export const metadata: Metadata = { title: "Requests" };

/** Requests of households: none are kept here, so the page leads to where the haul itself is logged. */
export default async function RequestsPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContext(slug);
  const actions = (
    <>
      {can(ctx.actor.role, "pickups.make") ? <Button href={`/o/${slug}/pickups/new`}>New haul</Button> : null}
      <Button variant="line" href={`/o/${slug}/pickups`}>
        See pickups
      </Button>
    </>
  );
  return (
    <div className="page">
      <PageHead title="Requests" fact="Who asked to have things taken away." />
      <Panel>
        <EmptyState title="No requests are kept" actions={actions}>
          When somebody calls you out, log the haul when you have it and choose call-out. Its place and note say who asked.
        </EmptyState>
      </Panel>
    </div>
  );
}
