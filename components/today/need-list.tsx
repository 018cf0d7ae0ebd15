import type { ReactNode } from "react";
import { Button } from "@/components/ui/button";
import { Panel } from "@/components/ui/panel";
import { formatMoney, formatPrice, formatShortDate, formatWeight, formatWeightUnit } from "@/lib/format";
import type { Need } from "@/lib/today/pages";

type Terms = { slug: string; currency: string; unit: string; today: string };
type Words = { tone: "hold" | "bad" | "act" | "plain"; title: string; detail: string; href: string; action: string };

const days = (count: number) => (count === 1 ? "1 day" : `${count} days`);

/** What a need says and where it leads. */
function wordsOf(need: Need, { slug, currency, unit, today }: Terms): Words {
  const at = (path: string) => `/o/${slug}${path}`;
  const date = (day: string) => formatShortDate(day, { today });
  switch (need.kind) {
    case "hold":
      return {
        tone: "hold",
        title: `${need.kindName} waits for: ${need.record.toLowerCase()}`,
        detail: `Pickup ${need.number}, ${date(need.pickedUpOn)}. On hold, do not cut or sell.`,
        href: at(`/pickups/${need.pickupId}`),
        action: "See haul",
      };
    case "wrong-sums":
      return {
        tone: "bad",
        title: `Ticket ${need.number} does not add up`,
        detail: `${need.yardName}, ${date(need.ticketOn)}. Kept as the paper says.`,
        href: at(`/tickets/${need.ticketId}`),
        action: "Compare",
      };
    case "unpaid":
      return {
        tone: need.days > 14 ? "bad" : "plain",
        title: `Ticket ${need.number} is not paid`,
        detail: `${need.yardName}, ${need.days <= 0 ? "from today" : `${days(need.days)} old`}.${need.leftMinor === null ? "" : ` ${formatMoney(need.leftMinor, currency)} left.`}`,
        href: at(`/tickets/${need.ticketId}`),
        action: "Record payment",
      };
    case "draft":
      return {
        tone: "plain",
        title: `Draft of ticket ${need.number} waits`,
        detail: `${need.yardName}, ${date(need.ticketOn)}. Nothing is booked until it is posted.`,
        href: at(`/tickets/${need.ticketId}`),
        action: "See draft",
      };
    case "sell-point":
      return {
        tone: "act",
        title: `${need.label} is at its sell point`,
        detail: `${need.gradeName}, ${formatWeight(need.quantity)} of ${formatWeightUnit(need.sellPoint, unit, { places: 0 })}.${
          need.best === null ? "" : ` ${need.best.yardName} pays ${formatPrice(need.best.normalised)} per ${unit}.`
        }`,
        href: at(`/bins?grade=${need.gradeId}`),
        action: "See bin",
      };
    case "stale-sheet":
      return {
        tone: "plain",
        title: `${need.yardName}’s sheet is ${days(need.days)} old`,
        detail: need.leaning === 0 ? "No best price leans on it." : `${need.leaning} of our best prices ${need.leaning === 1 ? "leans" : "lean"} on it.`,
        href: at(`/prices/sheets/new?yard=${need.yardId}`),
        action: "New sheet",
      };
  }
}

const keyOf = (need: Need): string => {
  switch (need.kind) {
    case "hold":
      return `${need.kind} ${need.pickupId} ${need.kindName}`;
    case "sell-point":
      return `${need.kind} ${need.binId}`;
    case "stale-sheet":
      return `${need.kind} ${need.yardId}`;
    default:
      return `${need.kind} ${need.ticketId}`;
  }
};

function NeedItem({ tone, title, detail, href, action }: Words): ReactNode {
  return (
    <li className={tone === "hold" ? "held" : undefined}>
      <i className={tone === "hold" ? "stripes" : `edge ${tone}`} aria-hidden="true" />
      <div>
        <b>{title}</b>
        <p>{detail}</p>
      </div>
      <Button variant="line" size="sm" href={href}>
        {action}
      </Button>
    </li>
  );
}

/** How many stand open; the rest are one press away. */
const SHOWN = 6;

/** What waits for somebody, the most dangerous first. */
export function NeedList({ needs, ...terms }: { needs: Need[] } & Terms) {
  const items = needs.map((need) => <NeedItem key={keyOf(need)} {...wordsOf(need, terms)} />);
  return (
    <Panel title="Needs you" end={<span className="mut n">{needs.length}</span>} className="needs">
      {needs.length === 0 ? <p className="in mut">Nothing waits.</p> : <ul>{items.slice(0, SHOWN)}</ul>}
      {items.length > SHOWN ? (
        <details>
          <summary className="link">{items.length - SHOWN} more</summary>
          <ul>{items.slice(SHOWN)}</ul>
        </details>
      ) : null}
    </Panel>
  );
}
