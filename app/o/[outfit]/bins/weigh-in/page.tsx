import type { Metadata } from "next";
import { WeighInForm } from "@/components/bins/weigh-in-form";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PhoneBar } from "@/components/ui/phone-bar";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { weighInScreen } from "@/lib/bins/pages";
import { getPickupPage } from "@/lib/pickups/pages";

export const metadata: Metadata = { title: "Weigh in" };

type Search = { pickup?: string | string[]; bin?: string | string[] };

/** Putting weighed metal into bins, one weighing after another. */
export default async function WeighInPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "weigh-ins.make");
  const [screen, search] = await Promise.all([weighInScreen(ctx), searchParams]);
  const pickup = typeof search.pickup === "string" ? ((await getPickupPage(ctx, search.pickup))?.pickup ?? null) : null;
  const mayAddBin = can(ctx.actor.role, "bins.change");
  if (screen.bins.length === 0) {
    return (
      <div className="phone">
        <PhoneBar back={{ href: `/o/${slug}/bins`, label: "Back to bins" }} title="Weigh in" />
        <div className="body">
          <EmptyState title="No bins yet" actions={mayAddBin ? <Button href={`/o/${slug}/bins/new`}>Add a bin</Button> : null}>
            Each bin holds one grade. Add one, then weigh into it.
          </EmptyState>
        </div>
      </div>
    );
  }
  return (
    <WeighInForm
      slug={slug}
      unit={ctx.outfit.weightUnit}
      timeZone={ctx.outfit.timeZone}
      today={ctx.today}
      screen={screen}
      memberId={ctx.actor.memberId}
      isOwner={ctx.actor.role === "owner"}
      mayAddBin={mayAddBin}
      presetPickup={pickup?.state === "open" ? { id: pickup.id, number: pickup.number, place: pickup.place, remainingWeight: pickup.remainingWeight } : null}
      presetBin={screen.bins.find((bin) => bin.id === search.bin)?.id ?? null}
    />
  );
}
