"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Panel } from "@/components/ui/panel";
import { GradeTag } from "@/components/ui/tag";
import { sum } from "@/lib/arithmetic/decimal";
import type { WeighIn } from "@/lib/bins/schema";
import { formatTime, formatWeight } from "@/lib/format";
import { ApiProblem, apiSend } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";

type Props = { slug: string; weighIns: WeighIn[]; unit: string; timeZone: string; memberId: string; isOwner: boolean };

/** What was weighed in today, newest first, each with a way back for who may take it. */
export function TodaysWeighIns({ slug, weighIns, unit, timeZone, memberId, isOwner }: Props) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const standing = weighIns.filter((weighIn) => weighIn.voidedAt === null);
  const undo = async (id: string) => {
    try {
      await apiSend(`/api/o/${slug}/weigh-ins/${id}/void`, { idempotencyKey: newId() });
      setProblem(null);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.problem.detail);
    }
  };
  if (weighIns.length === 0) return null;
  return (
    <Panel title="Today" sub={`${standing.length} weigh-ins, ${formatWeight(sum(standing.map((weighIn) => weighIn.net)), { places: 2 })} ${unit}`}>
      {problem ? (
        <p className="err in" role="alert">
          {problem}
        </p>
      ) : null}
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
            {weighIn.voidedAt ? (
              <span>taken back</span>
            ) : isOwner || weighIn.madeBy.id === memberId ? (
              <button type="button" className="btn line-b sm" onClick={() => void undo(weighIn.id)}>
                Undo
                <span className="vh">
                  {" "}
                  {formatWeight(weighIn.net, { places: 2 })} in {weighIn.binLabel}
                </span>
              </button>
            ) : null}
          </li>
        ))}
      </ul>
    </Panel>
  );
}
