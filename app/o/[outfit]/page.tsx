import { FirstThings } from "@/components/today/first-things";
import { HaulList } from "@/components/today/haul-list";
import { MonthPanel } from "@/components/today/month-panel";
import { NeedList } from "@/components/today/need-list";
import { StandingPanel } from "@/components/today/standing-panel";
import { PageHead } from "@/components/ui/page-head";
import { pageContext } from "@/lib/auth/page";
import { seesPrices } from "@/lib/auth/permissions";
import { monthOf } from "@/lib/clock";
import { formatDate } from "@/lib/format";
import { pickupListQuery } from "@/lib/pickups/schema";
import { seePickups } from "@/lib/pickups/service";
import { getToday, lineOf } from "@/lib/today/pages";

/** Today: what stands in the shop, what waits, and the month so far, as the role may see them. */
export default async function TodayPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContext(slug);
  const [{ standing, needs, month }, pickups, figures] = await Promise.all([
    getToday(ctx),
    seePickups(ctx, pickupListQuery.parse({ state: "open", limit: 5 })),
    lineOf(ctx),
  ]);
  const { currency, weightUnit: unit, hidesMoney } = ctx.outfit;
  const { role } = ctx.actor;
  const { today } = ctx;
  return (
    <div className="page aside today">
      <PageHead title={formatDate(today)} actions={<FirstThings slug={slug} role={role} />} />
      <NeedList needs={needs} slug={slug} currency={currency} unit={unit} today={today} />
      <div className="work">
        <HaulList slug={slug} pickups={pickups.items} count={figures.openPickups} unit={unit} today={today} />
        {month ? <MonthPanel slug={slug} month={monthOf(today)} currency={currency} figures={month} /> : null}
      </div>
      <StandingPanel slug={slug} standing={standing} unit={unit} currency={currency} money={seesPrices(role, hidesMoney)} />
    </div>
  );
}
