import { divide } from "@/lib/arithmetic/decimal";
import { decimalFromMinor, minorFromDecimal } from "@/lib/arithmetic/money";
import { formatMoney, formatMonth, formatWeight } from "@/lib/format";
import { netEffects } from "@/lib/money/rules";
import type { Earnings } from "@/lib/money/schema";
import Link from "next/link";

type Terms = { slug: string; currency: string; exponent: number; unit: string };

const perPickup = ({ netMinor, pickups }: Earnings, exponent: number): number | null =>
  pickups === 0 ? null : minorFromDecimal(divide(decimalFromMinor(netMinor, exponent), String(pickups), exponent), exponent);

/** The month's headline figures, each with the way to the records behind it. */
export function EarningsKey({ earnings, slug, currency, exponent, unit }: { earnings: Earnings } & Terms) {
  const { month, netMinor, salesMinor, quantity, pickups, before } = earnings;
  const each = perPickup(earnings, exponent);
  const last = formatMonth(before.month).split(" ")[0];
  const book = `/o/${slug}/money`;
  return (
    <dl className="key full">
      <div className="lead">
        <dt>Net, what the work left</dt>
        <dd>
          <Link href={`${book}/entries?month=${month}`}>
            <b className="n">{formatMoney(netMinor, currency)}</b>
          </Link>
        </dd>
      </div>
      <div>
        <dt>Sales</dt>
        <dd>
          <Link href={`${book}/entries?month=${month}&account=scrap-sales`}>
            <b className="n">{formatMoney(salesMinor, currency)}</b>
          </Link>
        </dd>
      </div>
      <div>
        <dt>Sold</dt>
        <dd>
          <Link href={`${book}/movements?month=${month}&place=sold`}>
            <b className="n">
              {formatWeight(quantity)}
              <span className="u">{unit}</span>
            </b>
          </Link>
        </dd>
      </div>
      <div>
        <dt>Net per pickup</dt>
        <dd>
          <b className="n">{each === null ? "–" : formatMoney(each, currency)}</b>
          <em className="n">{pickups === 1 ? "1 pickup" : `${pickups} pickups`}</em>
        </dd>
      </div>
      <div>
        <dt>Since {last}</dt>
        <dd>
          <b className="n">{formatMoney(netEffects(earnings).changeMinor, currency, { sign: true })}</b>
        </dd>
      </div>
    </dl>
  );
}
