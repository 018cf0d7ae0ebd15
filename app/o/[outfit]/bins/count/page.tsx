import type { Metadata } from "next";
import { CountForm } from "@/components/bins/count-form";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PhoneBar } from "@/components/ui/phone-bar";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { binsInUse } from "@/lib/bins/pages";

export const metadata: Metadata = { title: "Count" };

/** Weighing a bin to correct the book. */
export default async function CountPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<{ bin?: string | string[] }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "counts.make");
  const [bins, { bin }] = await Promise.all([binsInUse(ctx), searchParams]);
  if (bins.length === 0) {
    return (
      <div className="phone">
        <PhoneBar back={{ href: `/o/${slug}/bins`, label: "Back to bins" }} title="Count" />
        <div className="body">
          <EmptyState title="No bins yet" actions={can(ctx.actor.role, "bins.change") ? <Button href={`/o/${slug}/bins/new`}>Add a bin</Button> : null}>
            A count compares a bin with the book. Add a bin first.
          </EmptyState>
        </div>
      </div>
    );
  }
  return (
    <CountForm slug={slug} unit={ctx.outfit.weightUnit} today={ctx.today} bins={bins} preset={bins.find((one) => one.id === bin)?.id ?? bins[0]?.id ?? ""} />
  );
}
