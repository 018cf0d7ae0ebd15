import type { Metadata } from "next";
import { CostForm } from "@/components/money/cost-form";
import { currencySign } from "@/components/money/words";
import { pageContextFor } from "@/lib/auth/page";

export const metadata: Metadata = { title: "Add cost" };

/** Recording money spent. */
export default async function NewCostPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "costs.make");
  const { currency, exponent } = ctx.outfit;
  return <CostForm slug={slug} outfit={{ currency, exponent, sign: currencySign(currency) }} today={ctx.today} />;
}
