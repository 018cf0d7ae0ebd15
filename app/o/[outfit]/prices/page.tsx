import type { Metadata } from "next";
import { PriceTable } from "@/components/prices/price-table";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesPrices } from "@/lib/auth/permissions";
import { seePrices } from "@/lib/prices/service";

export const metadata: Metadata = { title: "Prices" };

/** What every yard pays today, grade by grade, with the best marked. */
export default async function PricesPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "prices.see");
  const { role } = ctx.actor;
  const actions = (
    <>
      <Button variant="line" href={`/o/${slug}/prices/yards`}>
        Yards
      </Button>
      <Button variant="line" href={`/o/${slug}/prices/sheets`}>
        Sheets
      </Button>
      {can(role, "prices.add") ? <Button href={`/o/${slug}/prices/sheets/new`}>New sheet</Button> : null}
    </>
  );
  if (!seesPrices(role, ctx.outfit.hidesMoney)) {
    return (
      <div className="page">
        <PageHead title="Prices" />
        <Panel>
          <EmptyState title="Prices are kept to the office">The owner of {ctx.outfit.name} decides who sees them.</EmptyState>
        </Panel>
      </div>
    );
  }
  const prices = await seePrices(ctx, {});
  return (
    <div className="page">
      <PageHead title="Prices" fact={`In force today, per ${ctx.outfit.weightUnit}. A price holds until the yard’s next sheet.`} actions={actions} />
      <Panel>
        {prices.grades.length === 0 ? (
          <EmptyState title="No price sheets yet" actions={can(role, "prices.add") ? <Button href={`/o/${slug}/prices/sheets/new`}>New sheet</Button> : null}>
            Type in what a yard pays, and every bin shows what it is worth.
          </EmptyState>
        ) : (
          <PriceTable prices={prices} currency={ctx.outfit.currency} unit={ctx.outfit.weightUnit} today={ctx.today} slug={slug} />
        )}
      </Panel>
    </div>
  );
}
