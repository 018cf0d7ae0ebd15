import { HazardMark } from "@/components/ui/hazard-mark";
import { GradeTag } from "@/components/ui/tag";
import { compare } from "@/lib/arithmetic/decimal";
import { hazardsOf } from "@/lib/catalogue/hazards";
import type { SheetPart } from "@/lib/catalogue/schema";
import { formatWeight } from "@/lib/format";

function Part({ part, unit }: { part: SheetPart; unit: string }) {
  const [hazard] = part.hazard === null ? [] : hazardsOf([part.hazard]);
  return (
    <li>
      <div className="hd">
        <h3>{part.name}</h3>
        {part.oftenMissed ? <span className="miss">often missed</span> : null}
        <GradeTag family={part.grade.family} name={part.grade.name} />
      </div>
      <div className="wt">
        <b className="n">
          {compare(part.typicalWeight, "0.01") < 0 ? "under 0.01" : formatWeight(part.typicalWeight, { places: 2 })}
          <span className="u">{unit}</span>
        </b>
        <small className="n">{part.perItem === 1 ? "one in each" : `${part.perItem} in each`}</small>
      </div>
      <div className="det">
        {hazard ? (
          <p className="care">
            <HazardMark />
            <span>
              {hazard.title}: {hazard.caution[0]}
            </span>
          </p>
        ) : null}
        <dl>
          <dt>Where</dt>
          <dd>{part.where}</dd>
          <dt>Looks like</dt>
          <dd>{part.looksLike}</dd>
          {part.test === null ? null : (
            <>
              <dt>Test</dt>
              <dd>{part.test}</dd>
            </>
          )}
          {part.altGrade === null ? null : (
            <>
              <dt>Or else</dt>
              <dd>{part.altGrade.name}</dd>
            </>
          )}
          {part.leaveAs === null ? null : (
            <>
              <dt>Left in</dt>
              <dd>counts as {part.leaveAs.name}</dd>
            </>
          )}
        </dl>
      </div>
    </li>
  );
}

/** The parts of a breakdown sheet in the order they come out. */
export function SheetParts({ parts, unit }: { parts: SheetPart[]; unit: string }) {
  return (
    <ol className="parts">
      {parts.map((part) => (
        <Part key={part.position} part={part} unit={unit} />
      ))}
    </ol>
  );
}
