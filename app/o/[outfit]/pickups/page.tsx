import type { Metadata } from "next";
import { PickupFilters, type PickupView } from "@/components/pickups/pickup-filters";
import { PickupList } from "@/components/pickups/pickup-list";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesCost, seesPrices } from "@/lib/auth/permissions";
import { AppError } from "@/lib/http/errors";
import { pickupListQuery, type PickupListQuery } from "@/lib/pickups/schema";
import { seePickups } from "@/lib/pickups/service";

export const metadata: Metadata = { title: "Pickups" };

type Search = Record<string, string | string[] | undefined>;

const viewOf = (state: unknown): PickupView => (state === "worked-out" || state === "void" || state === "all" ? state : "open");

/** What the address asks for. An address that makes no sense shows the first page of that state and says so. */
function askedOf(search: Search): { view: PickupView; query: PickupListQuery; understood: boolean } {
  const { state: _state, ...rest } = search;
  const view = viewOf(search.state);
  const state = view === "all" ? {} : { state: view };
  const filled = Object.fromEntries(["from", "to", "cursor"].flatMap((name) => (rest[name] ? [[name, rest[name]]] : [])));
  const parsed = pickupListQuery.safeParse({ ...filled, ...state });
  return parsed.success ? { view, query: parsed.data, understood: true } : { view, query: pickupListQuery.parse(state), understood: false };
}

const NOTHING: Record<PickupView, string> = {
  open: "No open hauls",
  "worked-out": "No hauls worked out",
  void: "No void hauls",
  all: "No hauls yet",
};

/** Hauls, the open ones first: what lies on the pile. */
export default async function PickupsPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "pickups.see");
  const { view, query, understood } = askedOf(await searchParams);
  const { role } = ctx.actor;
  const page = await seePickups(ctx, query).catch((error: unknown) => {
    // A cursor that was cut short in copying is no reason for an error page.
    if (error instanceof AppError && error.code === "input") return null;
    throw error;
  });
  const mayMake = can(role, "pickups.make");
  const newHaul = mayMake ? <Button href={`/o/${slug}/pickups/new`}>New haul</Button> : null;
  const { from, to } = query;
  const days = new URLSearchParams({ state: view, ...(from ? { from } : {}), ...(to ? { to } : {}) });
  return (
    <div className="page">
      <PageHead title="Pickups" fact="Each stop’s haul, from the curb to the pile." actions={newHaul} />
      <PickupFilters slug={slug} view={view} from={from} to={to} today={ctx.today} />
      {understood && page ? null : <p className="notice">That address asks for days or a page that cannot be read. This is the whole list.</p>}
      {page === null || page.items.length === 0 ? (
        <Panel>
          <EmptyState title={NOTHING[view]} actions={newHaul}>
            {view === "open"
              ? "A haul stays open until everything in it is weighed or written off. Log the next one at the curb."
              : "Choose another state or other days above."}
          </EmptyState>
        </Panel>
      ) : (
        <PickupList
          slug={slug}
          pickups={page.items}
          unit={ctx.outfit.weightUnit}
          currency={ctx.outfit.currency}
          today={ctx.today}
          money={seesCost(role) || (role === "collector" && seesPrices(role, ctx.outfit.hidesMoney))}
        />
      )}
      {page?.nextCursor ? (
        <div>
          <Button variant="line" href={`/o/${slug}/pickups?${days.toString()}&cursor=${page.nextCursor}`}>
            Older hauls
          </Button>
        </div>
      ) : null}
    </div>
  );
}
