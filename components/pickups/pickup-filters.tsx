import Link from "next/link";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { STATE_NAME } from "./words";

export type PickupView = "open" | "worked-out" | "void" | "all";

const VIEWS: PickupView[] = ["open", "worked-out", "void", "all"];
const nameOf = (view: PickupView) => (view === "all" ? "All" : STATE_NAME[view]);

interface PickupFiltersProps {
  slug: string;
  view: PickupView;
  from?: string;
  to?: string;
  today: string;
}

/** The filter of the list, all of it in the address: state by link, days by a plain form that works without script. */
export function PickupFilters({ slug, view, from, to, today }: PickupFiltersProps) {
  const address = (state: PickupView) => `/o/${slug}/pickups?${new URLSearchParams({ state, ...(from ? { from } : {}), ...(to ? { to } : {}) }).toString()}`;
  return (
    <div className="filters">
      <nav className="chips" style={{ "--cols": VIEWS.length }} aria-label="State">
        {VIEWS.map((one) => (
          <Link key={one} className="chip" href={address(one)} aria-current={one === view ? "page" : undefined}>
            {nameOf(one)}
          </Link>
        ))}
      </nav>
      <details open={from !== undefined || to !== undefined}>
        <summary>{from !== undefined || to !== undefined ? "Days chosen" : "Choose days"}</summary>
        <form method="get" action={`/o/${slug}/pickups`}>
          <input type="hidden" name="state" value={view} />
          <TextField id="from" name="from" label="From" type="date" max={today} defaultValue={from} />
          <TextField id="to" name="to" label="To" type="date" max={today} defaultValue={to} />
          <Button type="submit" variant="line">
            Show days
          </Button>
        </form>
      </details>
    </div>
  );
}
