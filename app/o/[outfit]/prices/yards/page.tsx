import type { Metadata } from "next";
import Link from "next/link";
import { Button } from "@/components/ui/button";
import { EmptyState } from "@/components/ui/empty-state";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { StatusWord } from "@/components/ui/status-word";
import { pageContextFor } from "@/lib/auth/page";
import { can } from "@/lib/auth/permissions";
import { seeYards } from "@/lib/prices/service";

export const metadata: Metadata = { title: "Yards" };

/** The buyers. */
export default async function YardsPage({ params }: { params: Promise<{ outfit: string }> }) {
  const { outfit: slug } = await params;
  const ctx = await pageContextFor(slug, "yards.see");
  const { items } = await seeYards(ctx);
  const add = can(ctx.actor.role, "yards.change") ? <Button href={`/o/${slug}/prices/yards/new`}>Add a yard</Button> : null;
  return (
    <div className="page">
      <PageHead title="Yards" fact="Who buys from you, when they are open, and what they ask for." actions={add} />
      <Panel>
        {items.length === 0 ? (
          <EmptyState title="No yards yet" actions={add}>
            Add the first yard you sell to.
          </EmptyState>
        ) : (
          <LedgerTable caption="Yards, those in use first" rows="roomy">
            <thead>
              <tr>
                <Th>Yard</Th>
                <Th>Place</Th>
                <Th>Hours</Th>
                <Th>Phone</Th>
                <Th>In use</Th>
              </tr>
            </thead>
            <tbody>
              {items.map((yard) => (
                <tr key={yard.id}>
                  <RowHead>
                    <Link href={`/o/${slug}/prices/yards/${yard.id}`}>{yard.name}</Link>
                  </RowHead>
                  <Td className="wrap">{yard.place ?? ""}</Td>
                  <Td className="wrap">{yard.hours ?? ""}</Td>
                  <Td>{yard.phone ?? ""}</Td>
                  <Td>
                    <StatusWord tone={yard.active ? "plain" : "quiet"}>{yard.active ? "in use" : "not used"}</StatusWord>
                  </Td>
                </tr>
              ))}
            </tbody>
          </LedgerTable>
        )}
      </Panel>
    </div>
  );
}
