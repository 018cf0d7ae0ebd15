import type { Metadata } from "next";
import { askedOf, without, type Search } from "@/components/money/asked";
import { BookFilter } from "@/components/money/book-filter";
import { EntryTable } from "@/components/money/entry-table";
import { MoneyNav } from "@/components/money/money-nav";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { formatMoney } from "@/lib/format";
import { AppError } from "@/lib/http/errors";
import { getEntriesPage } from "@/lib/money/pages";
import { entryListQuery } from "@/lib/money/schema";

export const metadata: Metadata = { title: "Money book" };

/** The money book: the entries behind every amount. */
export default async function EntriesPage({ params, searchParams }: { params: Promise<{ outfit: string }>; searchParams: Promise<Search> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "books.see");
  const { query, given, understood } = askedOf(entryListQuery, await searchParams);
  const read = await getEntriesPage(ctx, query).catch((error: unknown) => {
    // A cursor that was cut short in copying is no reason for an error page.
    if (error instanceof AppError && error.code === "input") return null;
    throw error;
  });
  const page = read ?? (await getEntriesPage(ctx, entryListQuery.parse({})));
  const { currency } = ctx.outfit;
  const here = `/o/${slug}/money/entries`;
  const total = page.totalMinor === null || read === null ? null : formatMoney(Math.abs(page.totalMinor), currency);
  const side = (page.totalMinor ?? 0) < 0 ? "credit" : "debit";
  return (
    <div className="page">
      <PageHead title="Money book" fact="Nothing in it is ever changed: a mistake is taken back by an entry that points at it." />
      <MoneyNav slug={slug} current="entries" />
      {understood && read ? null : <p className="notice">That address asks for something that cannot be read. This is the whole book.</p>}
      <BookFilter
        action={here}
        month={query.month}
        choice={{
          name: "account",
          label: "Account",
          value: query.account,
          options: page.accounts.map((account) => ({ value: account.code, label: account.name })),
        }}
        kept={without(given, "month", "account", "cursor")}
      />
      <Panel
        {...(total === null
          ? {}
          : {
              title: [page.accounts.find((one) => one.code === query.account)?.name, page.grade].filter(Boolean).join(", ") || "Together",
              end: `${total} ${side}`,
            })}
      >
        {page.items.length === 0 ? (
          <EmptyState title="No entries like that">Choose another month or account above.</EmptyState>
        ) : (
          <EntryTable slug={slug} entries={page.items} currency={currency} today={ctx.today} />
        )}
      </Panel>
      {page.nextCursor ? (
        <div>
          <Button variant="line" href={`${here}?${new URLSearchParams({ ...without(given, "cursor"), cursor: page.nextCursor }).toString()}`}>
            Older entries
          </Button>
        </div>
      ) : null}
    </div>
  );
}
