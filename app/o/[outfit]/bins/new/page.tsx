import type { Metadata } from "next";
import { BinForm } from "@/components/bins/bin-form";
import { PageHead } from "@/components/ui/page-head";
import { pageContextFor } from "@/lib/auth/page";
import { gradesToHold } from "@/lib/catalogue/pages";

export const metadata: Metadata = { title: "Add a bin" };

/** Adding a bin. */
export default async function NewBinPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "bins.change");
  return (
    <div className="page narrow-page">
      <PageHead title="Add a bin" fact="One grade a bin." />
      <BinForm slug={slug} unit={ctx.outfit.weightUnit} grades={await gradesToHold(ctx)} kept={null} />
    </div>
  );
}
