import type { Metadata } from "next";
import { YardForm } from "@/components/prices/yard-form";
import { pageContextFor } from "@/lib/auth/page";

export const metadata: Metadata = { title: "Add a yard" };

/** Adding a yard. */
export default async function NewYardPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  await pageContextFor(slug, "yards.change");
  return (
    <div className="page narrow-page">
      <YardForm slug={slug} kept={null} />
    </div>
  );
}
