import type { Metadata } from "next";
import { HaulForm } from "@/components/pickups/haul-form";
import { pageContextFor } from "@/lib/auth/page";
import { formatDate, formatTime } from "@/lib/format";
import { kindsToCount } from "@/lib/pickups/pages";

export const metadata: Metadata = { title: "New haul" };

/** Logging a curbside haul. */
export default async function NewHaulPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "pickups.make");
  const kinds = await kindsToCount(ctx);
  const { weightUnit, currency, exponent, timeZone } = ctx.outfit;
  return (
    <HaulForm
      slug={slug}
      memberId={ctx.actor.memberId}
      outfit={{ weightUnit, currency, exponent }}
      today={ctx.today}
      clock={`${formatDate(ctx.today, { today: ctx.today })}, ${formatTime(ctx.now, timeZone)}`}
      kinds={kinds}
    />
  );
}
