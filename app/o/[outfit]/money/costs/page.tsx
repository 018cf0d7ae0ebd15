import type { Metadata } from "next";
import { askedOf, without, type Search } from "@/components/money/asked";
import { CostTable } from "@/components/money/cost-table";
import { MoneyNav } from "@/components/money/money-nav";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { actsOnAll, can } from "@/lib/auth/permissions";
import { AppError } from "@/lib/http/errors";
import { costListQuery } from "@/lib/money/schema";
import { seeCosts } from "@/lib/money/service";

export const metadata: Metadata = { title: "Costs" };

/** Money spent on running the work; a collector or sorter sees their own. */
export default async function CostsPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "costs.see");
  const { query, given, understood } = askedOf(costListQuery, await searchParams);
  const page = await seeCosts(ctx, query).catch((error: unknown) => {
    // A cursor that was cut short in copying is no reason for an error page.
    if (error instanceof AppError && error.code === "input") return null;
    throw error;
  });
  const { role } = ctx.actor;
  const add = can(role, "costs.make") ? <Button href={`/o/${slug}/money/costs/new`}>Add cost</Button> : null;
  return (
    <div className="page">
      <PageHead title="Costs" fact={actsOnAll(role) ? "What running the work took." : "What you spent on running the work."} actions={add} />
      {can(role, "earnings.see") ? <MoneyNav slug={slug} current="costs" /> : null}
      {understood && page ? null : <p className="notice">That address asks for days or a page that cannot be read. This is the whole list.</p>}
      <Panel>
        {page === null || page.items.length === 0 ? (
          <EmptyState title="No costs yet" actions={add}>
            Fuel, disposal, supplies, repairs: five things to say, and the month’s net has it.
          </EmptyState>
        ) : (
          <CostTable slug={slug} costs={page.items} currency={ctx.outfit.currency} today={ctx.today} />
        )}
      </Panel>
      {page?.nextCursor ? (
        <div>
          <Button variant="line" href={`/o/${slug}/money/costs?${new URLSearchParams({ ...without(given, "cursor"), cursor: page.nextCursor }).toString()}`}>
            Older costs
          </Button>
        </div>
      ) : null}
    </div>
  );
}
