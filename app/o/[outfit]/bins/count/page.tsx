import type { Metadata } from "next";
import { CountForm } from "@/components/bins/count-form";
import { pageContextFor } from "@/lib/auth/page";
import { binsInUse } from "@/lib/bins/pages";

export const metadata: Metadata = { title: "Count" };

/** Weighing a bin to correct the book. */
export default async function CountPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<{ bin?: string | string[] }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "counts.make");
  const [bins, { bin }] = await Promise.all([binsInUse(ctx), searchParams]);
  return (
    <CountForm slug={slug} unit={ctx.outfit.weightUnit} today={ctx.today} bins={bins} preset={bins.find((one) => one.id === bin)?.id ?? bins[0]?.id ?? ""} />
  );
}
