import { EmptyState } from "@/components/ui/empty-state";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import type { Count, WeighIn } from "@/lib/bins/schema";
import { formatDate, formatWeight } from "@/lib/format";
import { TakeBack } from "./take-back";

/** Who looks, so that each sees a way back beside what they may take back. */
type Viewer = { memberId: string; isOwner: boolean; mayWeigh: boolean; mayCount: boolean };
type Props = { slug: string; weighIns: WeighIn[]; counts: Count[]; unit: string; today: string; viewer: Viewer };

/** The last weigh-ins into a bin and the last counts of it. */
export function BinHistory({ slug, weighIns, counts, unit, today, viewer }: Props) {
  const own = (record: { madeBy: { id: string } }) => viewer.isOwner || record.madeBy.id === viewer.memberId;
  return (
    <>
      <Panel title="Weighed in" sub="the last ones">
        {weighIns.length === 0 ? (
          <EmptyState title="Nothing yet">What is weighed into this bin shows here.</EmptyState>
        ) : (
          <LedgerTable caption="The last weigh-ins into this bin">
            <thead>
              <tr>
                <Th>Day</Th>
                <Th>From</Th>
                <Th>By</Th>
                <Th numeric unit={unit}>
                  Gross
                </Th>
                <Th numeric unit={unit}>
                  Tare
                </Th>
                <Th numeric unit={unit}>
                  Net
                </Th>
                <Th>
                  <span className="vh">Taking back</span>
                </Th>
              </tr>
            </thead>
            <tbody>
              {weighIns.map((weighIn) => (
                <tr key={weighIn.id}>
                  <RowHead>{formatDate(weighIn.weighedOn, { today })}</RowHead>
                  <Td>{weighIn.pickupNumber === null ? (weighIn.fromPile ? "the pile" : "outside") : `pickup ${weighIn.pickupNumber}`}</Td>
                  <Td>{weighIn.madeBy.name}</Td>
                  <Td numeric>{formatWeight(weighIn.gross, { places: 2 })}</Td>
                  <Td numeric>{formatWeight(weighIn.tare, { places: 2 })}</Td>
                  <Td numeric>{weighIn.voidedAt ? <s>{formatWeight(weighIn.net, { places: 2 })}</s> : <b>{formatWeight(weighIn.net, { places: 2 })}</b>}</Td>
                  <Td>
                    <TakeBack
                      path={`/api/o/${slug}/weigh-ins/${weighIn.id}`}
                      what={`the weigh-in of ${formatWeight(weighIn.net, { places: 2 })} ${unit}`}
                      voided={weighIn.voidedAt !== null}
                      may={viewer.mayWeigh && own(weighIn)}
                    />
                  </Td>
                </tr>
              ))}
            </tbody>
          </LedgerTable>
        )}
      </Panel>
      {counts.length === 0 ? null : (
        <Panel title="Counted">
          <LedgerTable caption="The last counts of this bin">
            <thead>
              <tr>
                <Th>Day</Th>
                <Th>By</Th>
                <Th numeric unit={unit}>
                  Book
                </Th>
                <Th numeric unit={unit}>
                  Scale
                </Th>
                <Th numeric unit={unit}>
                  Difference
                </Th>
                <Th>
                  <span className="vh">Taking back</span>
                </Th>
              </tr>
            </thead>
            <tbody>
              {counts.map((count) => (
                <tr key={count.id}>
                  <RowHead>{formatDate(count.countedOn, { today })}</RowHead>
                  <Td>{count.madeBy.name}</Td>
                  <Td numeric>{formatWeight(count.bookQuantity, { places: 2 })}</Td>
                  <Td numeric>{formatWeight(count.net, { places: 2 })}</Td>
                  <Td numeric>
                    {count.voidedAt ? (
                      <s>{formatWeight(count.difference, { places: 2, sign: true })}</s>
                    ) : (
                      formatWeight(count.difference, { places: 2, sign: true })
                    )}
                  </Td>
                  <Td>
                    <TakeBack
                      path={`/api/o/${slug}/counts/${count.id}`}
                      what={`the count of ${formatWeight(count.net, { places: 2 })} ${unit}`}
                      voided={count.voidedAt !== null}
                      may={viewer.mayCount && own(count)}
                    />
                  </Td>
                </tr>
              ))}
            </tbody>
          </LedgerTable>
        </Panel>
      )}
    </>
  );
}
