import Link from "next/link";
import { HazardMark } from "@/components/ui/hazard-mark";
import { ItemIcon } from "@/components/ui/item-icons";
import { Panel } from "@/components/ui/panel";
import { markedHazards } from "@/lib/catalogue/hazards";
import type { ItemKind } from "@/lib/catalogue/schema";
import { formatWeightUnit } from "@/lib/format";

/** Item kinds by group, each leading to its breakdown sheet. */
export function KindList({ slug, kinds, unit }: { slug: string; kinds: ItemKind[]; unit: string }) {
  const groups = [...new Set(kinds.map((kind) => kind.group))].toSorted();
  return groups.map((group) => {
    const own = kinds.filter((kind) => kind.group === group);
    return (
      <Panel key={group} title={<span className="first-upper inline-block">{group}</span>} sub={own.length === 1 ? "1 sheet" : `${own.length} sheets`}>
        <ul className="kind-list">
          {own.map((kind) => {
            const [hazard] = markedHazards(kind.hazards);
            return (
              <li key={kind.id}>
                <Link href={`/o/${slug}/bench/sheets/${kind.id}`}>
                  <ItemIcon kind={kind.key ?? ""} group={kind.group} />
                  <b>
                    {kind.name} {hazard ? <HazardMark label={`Hazard: ${hazard.title}`} /> : null}
                  </b>
                  <span className="n">{formatWeightUnit(kind.typicalWeight, unit)}</span>
                  <small>{kind.minutes === null ? "minutes not known" : `about ${kind.minutes} min to take apart`}</small>
                </Link>
              </li>
            );
          })}
        </ul>
      </Panel>
    );
  });
}
