import { Panel } from "@/components/ui/panel";
import { GradeTag } from "@/components/ui/tag";
import { sum } from "@/lib/arithmetic/decimal";
import type { WeighIn } from "@/lib/bins/schema";
import { formatTime, formatWeight } from "@/lib/format";
import { TakeBack } from "./take-back";
import { counted } from "./words";

type Props = { slug: string; weighIns: WeighIn[]; unit: string; timeZone: string; memberId: string; isOwner: boolean };

/** What was weighed in today, newest first, each with a way back for who may take it. */
export function TodaysWeighIns({ slug, weighIns, unit, timeZone, memberId, isOwner }: Props) {
  const standing = weighIns.filter((weighIn) => weighIn.voidedAt === null);
  if (weighIns.length === 0) return null;
  return (
    <Panel
      title="Today"
      sub={`${counted(standing.length, "weigh-in", "weigh-ins")}, ${formatWeight(sum(standing.map((weighIn) => weighIn.net)), { places: 2 })} ${unit}`}
    >
      <ul className="weighed">
        {weighIns.map((weighIn) => (
          <li key={weighIn.id} className={weighIn.voidedAt ? "taken-back" : undefined}>
            <span className="n">{formatTime(weighIn.madeAt, timeZone)}</span>
            <GradeTag family={weighIn.family} name={weighIn.gradeName} />
            <span>{weighIn.binLabel}</span>
            <b className="n">
              {formatWeight(weighIn.net, { places: 2 })}
              <span className="u">{unit}</span>
            </b>
            <TakeBack
              path={`/api/o/${slug}/weigh-ins/${weighIn.id}`}
              what={`${formatWeight(weighIn.net, { places: 2 })} ${unit} in ${weighIn.binLabel}`}
              voided={weighIn.voidedAt !== null}
              may={isOwner || weighIn.madeBy.id === memberId}
            />
          </li>
        ))}
      </ul>
    </Panel>
  );
}
