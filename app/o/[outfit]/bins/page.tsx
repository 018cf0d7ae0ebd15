import type { Metadata } from "next";
import { BinsTable } from "@/components/bins/bins-table";
import { GradePanel } from "@/components/bins/grade-panel";
import { counted } from "@/components/bins/words";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesCost, seesPrices } from "@/lib/auth/permissions";
import { binsScreen } from "@/lib/bins/pages";

export const metadata: Metadata = { title: "Bins" };

/** What is held, grade by grade, and what it is worth today. */
export default async function BinsPage({
  params,
  searchParams,
}: {
  params: Promise<{ outfit: string }>;
  searchParams: Promise<{ grade?: string | string[] }>;
}) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "bins.see");
  const { grade } = await searchParams;
  const { rows, chosen, yards, bins, binCount } = await binsScreen(ctx, typeof grade === "string" ? grade : undefined);
  const { role } = ctx.actor;
  const { weightUnit, currency } = ctx.outfit;
  const actions = (
    <>
      {can(role, "bins.change") ? (
        <Button variant="line" href={`/o/${slug}/bins/new`}>
          Add a bin
        </Button>
      ) : null}
      {can(role, "counts.make") && binCount > 0 ? (
        <Button variant="line" href={`/o/${slug}/bins/count`}>
          Count stock
        </Button>
      ) : null}
      {can(role, "weigh-ins.make") ? <Button href={`/o/${slug}/bins/weigh-in`}>Weigh in</Button> : null}
    </>
  );
  const prices = seesPrices(role, ctx.outfit.hidesMoney);
  return (
    <div className={chosen ? "page aside" : "page"}>
      <div className="full">
        <PageHead
          title="Bins"
          fact={`${counted(binCount, "bin", "bins")}, ${counted(rows.length, "grade", "grades")}.${prices ? " Value is weight at the best current price sheet." : ""}`}
          actions={actions}
        />
      </div>
      <Panel>
        {rows.length === 0 ? (
          <EmptyState title="No bins yet" actions={can(role, "bins.change") ? <Button href={`/o/${slug}/bins/new`}>Add a bin</Button> : null}>
            Each bin holds one grade. What you weigh into it shows here with what it is worth.
          </EmptyState>
        ) : (
          <BinsTable slug={slug} rows={rows} unit={weightUnit} currency={currency} chosen={chosen?.gradeId ?? null} cost={seesCost(role)} prices={prices} />
        )}
      </Panel>
      {chosen ? (
        <GradePanel
          slug={slug}
          row={chosen}
          yards={yards}
          bins={bins}
          unit={weightUnit}
          currency={currency}
          today={ctx.today}
          prices={prices}
          may={{ weigh: can(role, "weigh-ins.make"), sell: can(role, "tickets.draft") }}
        />
      ) : null}
    </div>
  );
}
