import Link from "next/link";
import { addMinor } from "@/lib/arithmetic/money";
import { formatMoney, formatMonth } from "@/lib/format";

interface MonthPanelProps {
  slug: string;
  month: string;
  currency: string;
  figures: { incomeMinor: number; scrapMinor: number; costsMinor: number };
}

/** The month as far as it has come, each figure with the way to what is behind it. */
export function MonthPanel({ slug, month, currency, figures }: MonthPanelProps) {
  const { incomeMinor, scrapMinor, costsMinor } = figures;
  const name = formatMonth(month).split(" ")[0];
  const money = (minor: number) => formatMoney(minor, currency);
  return (
    <dl className="key" aria-label={`${name} so far`}>
      <div className="lead">
        <dt>{name} net so far</dt>
        <dd>
          <b className="n">{money(addMinor(incomeMinor, -scrapMinor, -costsMinor))}</b>
        </dd>
      </div>
      <div>
        <dt>Sales and fees</dt>
        <dd>
          <b className="n">{money(incomeMinor)}</b>
        </dd>
      </div>
      <div>
        <dt>Cost of scrap sold</dt>
        <dd>
          <b className="n">{money(0 - scrapMinor)}</b>
        </dd>
      </div>
      <div>
        <dt>Running and other costs</dt>
        <dd>
          <b className="n">{money(0 - costsMinor)}</b>
        </dd>
      </div>
      <div>
        <dt>All of it</dt>
        <dd>
          <Link className="link" href={`/o/${slug}/money/${month}`}>
            Review {name}
          </Link>
        </dd>
      </div>
    </dl>
  );
}
