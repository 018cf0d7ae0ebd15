import Link from "next/link";
import { forDrawing } from "@/components/ui/charts/numbers";
import { ShareBar } from "@/components/ui/charts/share-bar";
import { EmptyState } from "@/components/ui/empty-state";
import { hatchFor, hatchName, hatchOrder } from "@/components/ui/families";
import { Panel } from "@/components/ui/panel";
import { Sum } from "@/components/ui/ledger-table";
import { GradeTag } from "@/components/ui/tag";
import { sum } from "@/lib/arithmetic/decimal";
import { addMinor } from "@/lib/arithmetic/money";
import { formatMoney, formatWeight } from "@/lib/format";
import type { Standing } from "@/lib/today/rules";

interface StandingPanelProps {
  slug: string;
  standing: Standing;
  unit: string;
  currency: string;
  /** Whether values may be seen. */
  money: boolean;
}

/** Families that share a hatch are one column, in the fixed order. */
function columnsOf(standing: Standing) {
  return hatchOrder
    .map((hatch) => ({ hatch, own: standing.families.filter((one) => hatchFor(one.family) === hatch) }))
    .filter(({ own }) => own.length > 0)
    .map(({ hatch, own }) => ({
      hatch,
      family: own[0]?.family ?? "other",
      quantity: sum(own.map((one) => one.quantity)),
      valueMinor: addMinor(...own.map((one) => one.valueMinor)),
    }));
}

/** What stands in the bins and what it is worth at each grade's best price, by family. */
export function StandingPanel({ slug, standing, unit, currency, money }: StandingPanelProps) {
  const { families } = standing;
  const weight = (value: string) => (
    <>
      {formatWeight(value)}
      <span className="u">{unit}</span>
    </>
  );
  const link = (
    <Link className="link" href={`/o/${slug}/bins`}>
      Open bins
    </Link>
  );
  if (families.length === 0)
    return (
      <Panel title="Standing in the shop" end={link} className="full">
        <EmptyState level={3} title="The bins are empty">
          Weigh metal into a bin and it stands here at once, for everyone.
        </EmptyState>
      </Panel>
    );
  const columns = columnsOf(standing);
  const biggest = columns.toSorted((a, b) => b.valueMinor - a.valueMinor)[0];
  const summary = `${formatWeight(standing.quantity)} ${unit} in ${columns.length} families${
    money && biggest ? `, worth ${formatMoney(standing.valueMinor, currency)}; most of it ${hatchName[biggest.hatch]}` : ""
  }. The columns below have the figures.`;
  const missing = money && standing.unpriced > 0 ? `. ${standing.unpriced === 1 ? "One grade has" : `${standing.unpriced} grades have`} no price` : "";
  return (
    <Panel title="Standing in the shop" sub={money ? `valued at each grade’s best price sheet${missing}` : "by weight"} end={link} padded className="full">
      <ShareBar
        families={families.map((one) => one.family)}
        upper={{ label: "Weight", values: families.map((one) => forDrawing(one.quantity)) }}
        {...(money && standing.valueMinor > 0 ? { lower: { label: "Value", values: families.map((one) => one.valueMinor) } } : {})}
        summary={summary}
      />
      <ul className="stand">
        {columns.map((column) => (
          <li key={column.hatch}>
            <GradeTag family={column.family} name={hatchName[column.hatch]} />
            <p className="n">{weight(column.quantity)}</p>
            {money ? <p className="n v">{formatMoney(column.valueMinor, currency)}</p> : null}
          </li>
        ))}
        <li className="tot">
          <b className="wide">All bins</b>
          <p className="n">{weight(standing.quantity)}</p>
          {money ? (
            <p className="n v">
              <Sum>{formatMoney(standing.valueMinor, currency)}</Sum>
            </p>
          ) : null}
        </li>
      </ul>
    </Panel>
  );
}
