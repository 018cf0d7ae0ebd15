import Link from "next/link";
import { Button } from "@/components/ui/button";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import { GradeTag } from "@/components/ui/tag";
import type { BinsRow } from "@/lib/bins/pages";
import type { Bin } from "@/lib/bins/schema";
import { formatAge, formatMoney, formatMoneyPlain, formatPrice, formatShortDate, formatWeight } from "@/lib/format";
import { counted } from "./words";

type YardOffer = { yardId: string; yardName: string; inForceFrom: string; price: string; ageDays: number; soldMinor: number };
type Props = {
  slug: string;
  row: BinsRow;
  yards: YardOffer[];
  bins: Bin[];
  unit: string;
  currency: string;
  today: string;
  prices: boolean;
  may: { weigh: boolean; sell: boolean };
};

function Offers({ yards, unit, currency, today }: Pick<Props, "yards" | "unit" | "currency" | "today">) {
  return (
    <LedgerTable caption="What each yard pays for it now" rows="mini">
      <thead>
        <tr>
          <Th>Yard</Th>
          <Th>Sheet</Th>
          <Th numeric>Age</Th>
          <Th numeric unit={`${currency}/${unit}`}>
            Price
          </Th>
          <Th numeric unit={currency}>
            If sold now
          </Th>
        </tr>
      </thead>
      <tbody>
        {yards.map((offer, index) => (
          <tr key={offer.yardId}>
            <RowHead>{index === 0 ? <b>{offer.yardName}</b> : offer.yardName}</RowHead>
            <Td>{formatShortDate(offer.inForceFrom, { today })}</Td>
            <Td numeric>{formatAge(offer.ageDays)}</Td>
            <Td numeric>{formatPrice(offer.price)}</Td>
            <Td numeric>{index === 0 ? <b>{formatMoneyPlain(offer.soldMinor, currency)}</b> : formatMoneyPlain(offer.soldMinor, currency)}</Td>
          </tr>
        ))}
      </tbody>
    </LedgerTable>
  );
}

/** The chosen grade: what is held, what each yard would pay, and which bins it stands in. */
export function GradePanel({ slug, row, yards, bins, unit, currency, today, prices, may }: Props) {
  return (
    <Panel>
      <div className="in grid gap-3 pt-3">
        <div className="flex flex-wrap items-center justify-between gap-2">
          <GradeTag family={row.family} name={row.name} />
          {row.daysHeld === null ? null : <span className="mut">oldest {counted(row.daysHeld, "day", "days")}</span>}
        </div>
        <dl className="held-figures">
          <div>
            <dt>in {counted(row.bins, "bin", "bins")}</dt>
            <dd className="n">
              {formatWeight(row.quantity)}
              <span className="u">{unit}</span>
            </dd>
          </div>
          {row.valueMinor === null ? null : (
            <div>
              <dt>worth</dt>
              <dd className="n">{formatMoney(row.valueMinor, currency)}</dd>
            </div>
          )}
          {row.costMinor === null ? null : (
            <div>
              <dt>cost us</dt>
              <dd className="n">{formatMoney(row.costMinor, currency)}</dd>
            </div>
          )}
        </dl>
      </div>
      {prices && yards.length > 0 ? <Offers yards={yards} unit={unit} currency={currency} today={today} /> : null}
      {prices && yards.length === 0 ? <p className="in">No yard has it on a sheet in force.</p> : null}
      <div className="in stands">
        <h2>Where it stands</h2>
        <ul className="people">
          {bins.map((bin) => (
            <li key={bin.id}>
              <div>
                <Link className="link" href={`/o/${slug}/bins/${bin.id}`}>
                  {bin.label}
                </Link>
                <span className="mut"> {bin.place ?? ""}</span>
              </div>
              <b className="n">
                {formatWeight(bin.balance)}
                <span className="u">{unit}</span>
              </b>
            </li>
          ))}
        </ul>
        <div className="flex flex-wrap gap-3 pt-2">
          {may.weigh && bins[0] ? (
            <Button variant="line" href={`/o/${slug}/bins/weigh-in?bin=${bins[0].id}`}>
              Weigh in
            </Button>
          ) : null}
          {may.sell ? <Button href={`/o/${slug}/tickets/new`}>Record a ticket</Button> : null}
        </div>
      </div>
    </Panel>
  );
}
