import type { Metadata } from "next";
import { SheetForm } from "@/components/prices/sheet-form";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { sheetToType } from "@/lib/prices/pages";

export const metadata: Metadata = { title: "New price sheet" };

/** Typing in a yard's sheet, with the yard's last one to change from. */
export default async function NewSheetPage({
  params,
  searchParams,
}: {
  params: Promise<{ outfit: string }>;
  searchParams: Promise<{ yard?: string | string[] }>;
}) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "prices.add");
  const { yard } = await searchParams;
  const { yards, yardId, rows, copiedFrom } = await sheetToType(ctx, typeof yard === "string" ? yard : undefined);
  if (yards.length === 0) {
    return (
      <div className="page">
        <PageHead title="New price sheet" />
        <Panel>
          <EmptyState
            title="No yards yet"
            actions={can(ctx.actor.role, "yards.change") ? <Button href={`/o/${slug}/prices/yards/new`}>Add a yard</Button> : null}
          >
            A sheet belongs to a yard. Add the yard first.
          </EmptyState>
        </Panel>
      </div>
    );
  }
  const { weightUnit, currency } = ctx.outfit;
  return (
    <div className="page">
      <SheetForm
        key={yardId}
        slug={slug}
        outfit={{ weightUnit, currency }}
        today={ctx.today}
        yards={yards}
        start={{ yardId, inForceFrom: ctx.today, lastDay: "", rows }}
        copiedFrom={copiedFrom}
        kept={null}
      />
    </div>
  );
}
