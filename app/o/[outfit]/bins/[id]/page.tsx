import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { BinFacts } from "@/components/bins/bin-facts";
import { BinForm } from "@/components/bins/bin-form";
import { BinHistory } from "@/components/bins/bin-history";
import { PutAway } from "@/components/bins/put-away";
import { Button } from "@/components/ui/button";
import { PageHead } from "@/components/ui/page-head";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { binScreen } from "@/lib/bins/pages";
import { formatWeight } from "@/lib/format";

export const metadata: Metadata = { title: "Bin" };

/** One bin: what it holds, what went in, and what can be changed. */
export default async function BinPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "bins.see");
  const found = await binScreen(ctx, id);
  if (!found) notFound();
  const { bin, weighIns, counts } = found;
  const { role } = ctx.actor;
  const unit = ctx.outfit.weightUnit;
  const actions = (
    <>
      {can(role, "books.see") ? (
        <Button variant="line" href={`/o/${slug}/money/movements?place=bin&gradeId=${bin.gradeId}`}>
          Movements
        </Button>
      ) : null}
      {can(role, "counts.make") && bin.putAwayAt === null ? (
        <Button variant="line" href={`/o/${slug}/bins/count?bin=${bin.id}`}>
          Count
        </Button>
      ) : null}
      {can(role, "weigh-ins.make") && bin.putAwayAt === null ? <Button href={`/o/${slug}/bins/weigh-in?bin=${bin.id}`}>Weigh in</Button> : null}
    </>
  );
  return (
    <div className="page">
      <PageHead
        title={`Bin ${bin.label}`}
        fact={`${bin.gradeName}, ${formatWeight(bin.balance)} ${unit} in it${bin.putAwayAt ? ", put away" : ""}.`}
        actions={actions}
      />
      <BinFacts bin={bin} unit={unit} />
      <BinHistory
        slug={slug}
        weighIns={weighIns}
        counts={counts}
        unit={unit}
        today={ctx.today}
        viewer={{ memberId: ctx.actor.memberId, isOwner: role === "owner", mayWeigh: can(role, "weigh-ins.void"), mayCount: can(role, "counts.void") }}
      />
      {can(role, "bins.change") ? (
        <>
          <BinForm slug={slug} unit={unit} grades={[]} kept={bin} />
          <PutAway slug={slug} bin={bin} />
        </>
      ) : null}
    </div>
  );
}
