import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { SheetForm } from "@/components/prices/sheet-form";
import { pageContextFor } from "@/lib/auth/page";
import { sheetToChange } from "@/lib/prices/pages";

export const metadata: Metadata = { title: "Change price sheet" };

/** Typing a sheet again. */
export default async function EditSheetPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "prices.change");
  const found = await sheetToChange(ctx, id);
  if (!found) notFound();
  const { weightUnit, currency } = ctx.outfit;
  return (
    <div className="page">
      <SheetForm
        slug={slug}
        outfit={{ weightUnit, currency }}
        today={ctx.today}
        yards={[{ id: found.sheet.yardId, name: found.sheet.yardName }]}
        start={{ yardId: found.sheet.yardId, inForceFrom: found.sheet.inForceFrom, lastDay: found.sheet.lastDay ?? "", rows: found.rows }}
        copiedFrom={null}
        kept={{ id: found.sheet.id, version: found.sheet.version }}
      />
    </div>
  );
}
