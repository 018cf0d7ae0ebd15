import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Button } from "@/components/ui/button";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { GradeTag } from "@/components/ui/tag";
import { pageContextFor } from "@/lib/auth/page";
import { can, seesPrices } from "@/lib/auth/permissions";
import { formatDate, formatPrice } from "@/lib/format";
import { findSheet } from "@/lib/prices/pages";

export const metadata: Metadata = { title: "Price sheet" };

/** One price sheet as the yard quoted it. */
export default async function SheetPage({ params }: { params: Promise<{ outfit: string; id: string }> }) {
  const { outfit: slug, id } = await params;
  const ctx = await pageContextFor(slug, "prices.see");
  const sheet = seesPrices(ctx.actor.role, ctx.outfit.hidesMoney) ? await findSheet(ctx, id) : null;
  if (!sheet) notFound();
  const { role } = ctx.actor;
  const until = sheet.lastDay ? `to ${formatDate(sheet.lastDay, { today: ctx.today })}` : "until the next sheet";
  const actions = (
    <>
      {can(role, "prices.change") ? (
        <Button variant="line" href={`/o/${slug}/prices/sheets/${id}/edit`}>
          Change sheet
        </Button>
      ) : null}
      {can(role, "prices.add") ? <Button href={`/o/${slug}/prices/sheets/new?yard=${sheet.yardId}`}>Next sheet from this</Button> : null}
    </>
  );
  return (
    <div className="page">
      <PageHead
        title={sheet.yardName}
        fact={`In force from ${formatDate(sheet.inForceFrom, { today: ctx.today })} ${until}. Typed in by ${sheet.madeBy.name}.`}
        actions={actions}
      />
      <Panel>
        <LedgerTable caption={`Prices of ${sheet.yardName} from ${sheet.inForceFrom}`} rows="roomy">
          <thead>
            <tr>
              <Th>Grade</Th>
              <Th>Yard’s wording</Th>
              <Th numeric unit={ctx.outfit.currency}>
                Price
              </Th>
              <Th>Per</Th>
              <Th numeric unit={`${ctx.outfit.currency}/${ctx.outfit.weightUnit}`}>
                Comes to
              </Th>
            </tr>
          </thead>
          <tbody>
            {sheet.lines.map((line) => (
              <tr key={line.gradeId}>
                <RowHead>
                  <GradeTag family={line.family} name={line.gradeName} />
                </RowHead>
                <Td>{line.yardWording ?? ""}</Td>
                <Td numeric>
                  <b>{formatPrice(line.price)}</b>
                </Td>
                <Td>{line.per.replace("-", " ")}</Td>
                <Td numeric>{line.normalised === null ? "" : formatPrice(line.normalised)}</Td>
              </tr>
            ))}
          </tbody>
        </LedgerTable>
      </Panel>
    </div>
  );
}
