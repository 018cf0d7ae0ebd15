import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { SheetParts } from "@/components/bench/sheet-parts";
import { HoldCautions } from "@/components/catalogue/hold-caution";
import { Caution } from "@/components/ui/caution";
import { PhoneBar } from "@/components/ui/phone-bar";
import { pageContextFor } from "@/lib/auth/page";
import { workCautions } from "@/lib/catalogue/hazards";
import { getSheetPage } from "@/lib/catalogue/pages";
import { sum } from "@/lib/arithmetic/decimal";
import { formatWeightUnit } from "@/lib/format";

export const metadata: Metadata = { title: "Breakdown sheet" };

/** One breakdown sheet: the hazards first, then each part. */
export default async function SheetPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "catalogue.see");
  const kind = await getSheetPage(ctx, id);
  if (!kind) notFound();
  const unit = ctx.outfit.weightUnit;
  const cautions = workCautions(kind.hazards, kind.holdUntil);
  const missed = kind.parts.filter((part) => part.oftenMissed).length;
  return (
    <div className="phone sheet-page">
      <PhoneBar
        back={{ href: `/o/${slug}/bench`, label: "Back to bench" }}
        title={kind.name}
        fact={kind.minutes === null ? undefined : `${kind.minutes} min`}
      />
      <div className="body">
        <p className="sheet-item">
          <b>One {kind.name.toLowerCase()}</b>
          <b className="n">{formatWeightUnit(kind.typicalWeight, unit)}</b>
          <span className="first-upper">{kind.group}</span>
          <span className="n">parts {formatWeightUnit(sum(kind.parts.map((part) => part.typicalWeight)), unit)}</span>
        </p>
        <HoldCautions kinds={[kind]} />
        {cautions.length === 0 ? null : <Caution title="Before the cover comes off" lines={cautions} />}
        <h2 className="flex items-baseline justify-between pt-2">
          Parts
          <small className="n text-ink-2 font-medium">
            {missed === 0 ? `${kind.parts.length} parts` : `${kind.parts.length} parts, ${missed} often missed`}
          </small>
        </h2>
        <SheetParts parts={kind.parts} unit={unit} />
      </div>
    </div>
  );
}
