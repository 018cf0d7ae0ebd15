import type { Metadata } from "next";
import Link from "next/link";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesPrices } from "@/lib/auth/permissions";
import { formatDate } from "@/lib/format";
import { notFound } from "next/navigation";
import { sheetListQuery } from "@/lib/prices/schema";
import { seeSheets } from "@/lib/prices/service";

export const metadata: Metadata = { title: "Price sheets" };

/** Every price sheet, the latest first. */
export default async function SheetsPage({
  params,
  searchParams,
}: {
  params: Promise<{ outfit: string }>;
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "prices.see");
  if (!seesPrices(ctx.actor.role, ctx.outfit.hidesMoney)) notFound();
  const { cursor, yardId } = await searchParams;
  const parsed = sheetListQuery.safeParse({ ...(cursor ? { cursor } : {}), ...(yardId ? { yardId } : {}) });
  const page = await seeSheets(ctx, parsed.success ? parsed.data : sheetListQuery.parse({}));
  const add = can(ctx.actor.role, "prices.add") ? <Button href={`/o/${slug}/prices/sheets/new`}>New sheet</Button> : null;
  return (
    <div className="page">
      <PageHead title="Price sheets" fact="Kept as the yards quoted them." actions={add} />
      <Panel>
        {page.items.length === 0 ? (
          <EmptyState title="No price sheets yet" actions={add}>
            Type in what a yard pays, and every bin shows what it is worth.
          </EmptyState>
        ) : (
          <LedgerTable caption="Price sheets, the latest first">
            <thead>
              <tr>
                <Th>In force from</Th>
                <Th>Yard</Th>
                <Th>Last day</Th>
                <Th numeric>Prices</Th>
                <Th>Typed in by</Th>
              </tr>
            </thead>
            <tbody>
              {page.items.map((sheet) => (
                <tr key={sheet.id}>
                  <RowHead>
                    <Link href={`/o/${slug}/prices/sheets/${sheet.id}`}>{formatDate(sheet.inForceFrom, { today: ctx.today })}</Link>
                  </RowHead>
                  <Td>{sheet.yardName}</Td>
                  <Td>{sheet.lastDay ? formatDate(sheet.lastDay, { today: ctx.today }) : "until the next"}</Td>
                  <Td numeric>{sheet.lineCount}</Td>
                  <Td>{sheet.madeBy.name}</Td>
                </tr>
              ))}
            </tbody>
          </LedgerTable>
        )}
      </Panel>
      {page.nextCursor ? (
        <div>
          <Button variant="line" href={`/o/${slug}/prices/sheets?cursor=${page.nextCursor}`}>
            Older sheets
          </Button>
        </div>
      ) : null}
    </div>
  );
}
