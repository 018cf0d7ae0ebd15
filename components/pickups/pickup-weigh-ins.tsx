import Link from "next/link";
import { EmptyState } from "@/components/ui/empty-state";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import { GradeTag } from "@/components/ui/tag";
import { formatDate, formatWeight } from "@/lib/format";
import type { PickupRecord } from "@/lib/pickups/schema";

/** What was weighed into bins from this haul. */
export function PickupWeighIns({ slug, pickup, unit, today }: { slug: string; pickup: PickupRecord; unit: string; today: string }) {
  if (pickup.weighIns.length === 0) {
    return (
      <Panel title="Weighed from it">
        {pickup.state === "open" ? (
          <EmptyState level={3} title="Nothing weighed from this haul yet">
            Take it apart, then weigh each grade into its bin.
          </EmptyState>
        ) : (
          <EmptyState level={3} title="Nothing was weighed from this haul" />
        )}
      </Panel>
    );
  }
  return (
    <Panel title="Weighed from it">
      <LedgerTable caption={`Weigh-ins from pickup ${pickup.number}`} rows="roomy">
        <thead>
          <tr>
            <Th>Grade</Th>
            <Th>Day</Th>
            <Th>Bin</Th>
            <Th numeric unit={unit}>
              Net
            </Th>
          </tr>
        </thead>
        <tbody>
          {pickup.weighIns.map((weighIn) => (
            <tr key={weighIn.id}>
              <RowHead>
                <GradeTag family={weighIn.family} name={weighIn.gradeName} />
              </RowHead>
              <Td className="n">{formatDate(weighIn.weighedOn, { today })}</Td>
              <Td>
                <Link href={`/o/${slug}/bins/${weighIn.binId}`}>{weighIn.binLabel}</Link>
                {weighIn.voidedAt === null ? null : <span className="mut"> void</span>}
              </Td>
              <Td numeric muted={weighIn.voidedAt !== null}>
                {weighIn.voidedAt === null ? formatWeight(weighIn.net) : <s>{formatWeight(weighIn.net)}</s>}
              </Td>
            </tr>
          ))}
        </tbody>
      </LedgerTable>
    </Panel>
  );
}
