import Link from "next/link";
import { kindsInWords, SOURCE_NAME } from "@/components/pickups/words";
import { Panel } from "@/components/ui/panel";
import { formatDate, formatWeightUnit } from "@/lib/format";
import type { Pickup } from "@/lib/pickups/schema";

/** The newest open hauls, each with what is left of it on the pile. */
export function HaulList({ slug, pickups, count, unit, today }: { slug: string; pickups: Pickup[]; count: number; unit: string; today: string }) {
  return (
    <Panel title="Pickups to sort" end={<span className="mut n">{count}</span>} className="needs hauls">
      {pickups.length === 0 ? <p className="in mut">The pile is empty.</p> : null}
      <ul>
        {pickups.map((pickup) => (
          <li key={pickup.id}>
            <div>
              <b>
                <Link href={`/o/${slug}/pickups/${pickup.id}`}>Pickup {pickup.number}</Link>
              </b>
              <p>{kindsInWords(pickup.kinds)}</p>
              <p>
                {formatDate(pickup.pickedUpOn, { today })}, {SOURCE_NAME[pickup.source].toLowerCase()}
                {pickup.place === null ? "" : `, ${pickup.place}`}
              </p>
            </div>
            <span className="n left">{formatWeightUnit(pickup.remainingWeight, unit)}</span>
          </li>
        ))}
      </ul>
      {count > pickups.length ? (
        <p className="in">
          <Link className="link" href={`/o/${slug}/pickups`}>
            All {count}
          </Link>
        </p>
      ) : null}
    </Panel>
  );
}
