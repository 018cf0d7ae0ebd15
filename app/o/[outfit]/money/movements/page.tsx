import type { Metadata } from "next";
import { askedOf, without, type Search } from "@/components/money/asked";
import { BookFilter } from "@/components/money/book-filter";
import { MoneyNav } from "@/components/money/money-nav";
import { MovementTable } from "@/components/money/movement-table";
import { PLACE_NAME } from "@/components/money/words";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { PLACES } from "@/db/words";
import { pageContextFor } from "@/lib/auth/page";
import { formatWeightUnit } from "@/lib/format";
import { AppError } from "@/lib/http/errors";
import { getMovementsPage } from "@/lib/money/pages";
import { movementListQuery } from "@/lib/money/schema";

export const metadata: Metadata = { title: "Weight book" };

/** The weight book: the movements behind every weight. */
export default async function MovementsPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "books.see");
  const { query, given, understood } = askedOf(movementListQuery, await searchParams);
  const read = await getMovementsPage(ctx, query).catch((error: unknown) => {
    // A cursor that was cut short in copying is no reason for an error page.
    if (error instanceof AppError && error.code === "input") return null;
    throw error;
  });
  const page = read ?? (await getMovementsPage(ctx, movementListQuery.parse({})));
  const { weightUnit: unit } = ctx.outfit;
  const here = `/o/${slug}/money/movements`;
  const about = [query.place === undefined ? null : PLACE_NAME[query.place], page.grade].filter(Boolean).join(", ") || "Together";
  return (
    <div className="page">
      <PageHead title="Weight book" fact="Every pound that moved, from outside to the yard." />
      <MoneyNav slug={slug} current="movements" />
      {understood && read ? null : <p className="notice">That address asks for something that cannot be read. This is the whole book.</p>}
      <BookFilter
        action={here}
        month={query.month}
        choice={{ name: "place", label: "Place", value: query.place, options: PLACES.map((value) => ({ value, label: PLACE_NAME[value] })) }}
        kept={without(given, "month", "place", "cursor")}
      />
      <Panel {...(page.total === null || read === null ? {} : { title: about, end: formatWeightUnit(page.total, unit, { places: 2, sign: true }) })}>
        {page.items.length === 0 ? (
          <EmptyState title="No movements like that">Choose another month or place above.</EmptyState>
        ) : (
          <MovementTable slug={slug} movements={page.items} unit={unit} today={ctx.today} />
        )}
      </Panel>
      {page.nextCursor ? (
        <div>
          <Button variant="line" href={`${here}?${new URLSearchParams({ ...without(given, "cursor"), cursor: page.nextCursor }).toString()}`}>
            Older movements
          </Button>
        </div>
      ) : null}
    </div>
  );
}
