import type { Metadata } from "next";
import { KindList } from "@/components/bench/kind-list";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { TextField } from "@/components/ui/field";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { findItemKinds } from "@/lib/catalogue/pages";

export const metadata: Metadata = { title: "Bench" };

type Search = { q?: string | string[] };

/** The bench: what is inside each item kind, and where to weigh what comes out. */
export default async function BenchPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "catalogue.see");
  const { q } = await searchParams;
  const words = typeof q === "string" ? q.slice(0, 100) : "";
  const kinds = await findItemKinds(ctx, words);
  const weigh = can(ctx.actor.role, "weigh-ins.make") ? (
    <Button variant="line" href={`/o/${slug}/bins/weigh-in`}>
      Weigh into a bin
    </Button>
  ) : null;
  return (
    <div className="page">
      <PageHead title="Bench" fact="Breakdown sheets: what is inside, where it sits, how to tell the metal." actions={weigh} />
      <form method="get" action={`/o/${slug}/bench`} className="kind-search" role="search">
        <TextField id="q" name="q" type="search" label="Find an item kind" defaultValue={words} autoComplete="off" />
        <Button type="submit" variant="line" size="lg">
          Find
        </Button>
      </form>
      {kinds.length === 0 ? (
        <Panel>
          <EmptyState
            title={`No sheet for “${words}”`}
            actions={
              <Button variant="line" href={`/o/${slug}/bench`}>
                Show all sheets
              </Button>
            }
          >
            Try a shorter word, or the room it stands in: kitchen, laundry, office.
          </EmptyState>
        </Panel>
      ) : (
        <KindList slug={slug} kinds={kinds} unit={ctx.outfit.weightUnit} />
      )}
    </div>
  );
}
