import Link from "next/link";
import { HazardMark } from "@/components/ui/hazard-mark";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import { markedHazards } from "@/lib/catalogue/hazards";
import { formatWeight } from "@/lib/format";
import type { PickupRecord } from "@/lib/pickups/schema";
import { itemsInWords } from "./words";

/** What was taken, kind by kind, with the hazards to mind. */
export function PickupItems({ slug, pickup, unit }: { slug: string; pickup: PickupRecord; unit: string }) {
  return (
    <Panel title="Items" sub={itemsInWords(pickup.itemCount)}>
      <LedgerTable caption={`Items of pickup ${pickup.number}`}>
        <thead>
          <tr>
            <Th>Item kind</Th>
            <Th numeric>Count</Th>
            <Th numeric unit={unit}>
              Estimate
            </Th>
          </tr>
        </thead>
        <tbody>
          {pickup.items.map((item) => {
            const hazards = markedHazards(item.hazards);
            return (
              <tr key={item.line}>
                <RowHead className="item-name">
                  <Link href={`/o/${slug}/bench/sheets/${item.itemKindId}`}>{item.name}</Link>
                  {hazards.length === 0 ? null : (
                    <span className="item-mind">
                      <HazardMark label="Hazard" />
                      {hazards.map((hazard) => hazard.title).join(", ")}
                    </span>
                  )}
                </RowHead>
                <Td numeric>{item.count}</Td>
                <Td numeric>
                  {formatWeight(item.estimatedWeight)}
                  {item.weighed === null ? null : <span className="mut"> weighed</span>}
                </Td>
              </tr>
            );
          })}
        </tbody>
        <tfoot>
          <tr>
            <th scope="row">All items</th>
            <Td numeric>
              <Sum>{pickup.itemCount}</Sum>
            </Td>
            <Td numeric>
              <Sum>{formatWeight(pickup.estimatedWeight)}</Sum>
            </Td>
          </tr>
        </tfoot>
      </LedgerTable>
    </Panel>
  );
}
