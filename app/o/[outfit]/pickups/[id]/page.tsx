import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { HoldCautions } from "@/components/catalogue/hold-caution";
import { PickupActions } from "@/components/pickups/pickup-actions";
import { PickupBooks } from "@/components/pickups/pickup-books";
import { PickupFigures } from "@/components/pickups/pickup-figures";
import { PickupItems } from "@/components/pickups/pickup-items";
import { PickupWeighIns } from "@/components/pickups/pickup-weigh-ins";
import { itemsInWords, SOURCE_NAME, STATE_NAME } from "@/components/pickups/words";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import type { Context } from "@/lib/auth/context";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { formatDate, formatMoney, formatWeightUnit } from "@/lib/format";
import { getPickupPage } from "@/lib/pickups/pages";
import { whyNotVoid } from "@/lib/pickups/rules";
import type { PickupRecord } from "@/lib/pickups/schema";

export const metadata: Metadata = { title: "Pickup" };

/** What saving has just booked, in one sentence. */
function bookedWords(pickup: PickupRecord, ctx: Context): string {
  const { weightUnit, currency } = ctx.outfit;
  const pile = `${itemsInWords(pickup.itemCount)}, about ${formatWeightUnit(pickup.estimatedWeight, weightUnit, { places: 0 })}, came onto the pile`;
  const paid = pickup.paidMinor ? `, and ${formatMoney(pickup.paidMinor, currency)} is booked as what it cost` : "";
  return `Pickup ${pickup.number} is saved. ${pile}${paid}.`;
}

function factOf(pickup: PickupRecord, today: string): string {
  const place = pickup.place === null ? "" : `, ${pickup.place}`;
  return `${SOURCE_NAME[pickup.source]}${place}, ${formatDate(pickup.pickedUpOn, { today })}, by ${pickup.madeBy.name}. ${STATE_NAME[pickup.state]}.`;
}

type Props = { params: Promise<{ outfit: string; id: string }>; searchParams: Promise<Record<string, string | string[] | undefined>> };

/** One haul: what was taken, what is left of it, what was made of it, and what both books have about it. */
export default async function PickupPage({ params, searchParams }: Props) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "pickups.see");
  const found = await getPickupPage(ctx, id);
  if (!found) notFound();
  const { pickup, weight, money } = found;
  const { weightUnit, currency } = ctx.outfit;
  const member = { id: ctx.actor.memberId, role: ctx.actor.role };
  const open = pickup.state === "open";
  const mayWeigh = open && can(member.role, "weigh-ins.make");
  return (
    <div className="page aside">
      <PageHead title={`Pickup ${pickup.number}`} fact={factOf(pickup, ctx.today)} />
      {(await searchParams).saved === "now" && pickup.state !== "void" ? (
        <p className="notice full" role="status">
          {bookedWords(pickup, ctx)}
        </p>
      ) : null}
      <div className="full grid grid-cols-[minmax(0,1fr)] gap-4">
        <PickupActions
          slug={slug}
          id={pickup.id}
          number={pickup.number}
          mayWeigh={mayWeigh}
          mayWorkOut={mayWeigh}
          mayVoid={
            pickup.state !== "void" && can(member.role, "pickups.change") && whyNotVoid(member, { madeBy: pickup.madeBy.id, state: pickup.state }) === null
          }
          left={formatWeightUnit(pickup.remainingWeight, weightUnit)}
        />
        <PickupFigures pickup={pickup} unit={weightUnit} currency={currency} />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        {open ? <HoldCautions kinds={pickup.items} /> : null}
        <PickupItems slug={slug} pickup={pickup} unit={weightUnit} />
        <PickupWeighIns slug={slug} pickup={pickup} unit={weightUnit} today={ctx.today} />
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        {pickup.note === null ? null : (
          <Panel title="Note" padded>
            <p className="whitespace-pre-wrap">{pickup.note}</p>
          </Panel>
        )}
        <PickupBooks weight={weight} money={money} unit={weightUnit} currency={currency} today={ctx.today} />
      </div>
    </div>
  );
}
