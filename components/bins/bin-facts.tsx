import { GradeTag } from "@/components/ui/tag";
import type { Bin } from "@/lib/bins/schema";
import { formatWeight } from "@/lib/format";

/** What is known of a bin: its grade, what it holds, its tare, its place and the weight to sell at. */
export function BinFacts({ bin, unit }: { bin: Bin; unit: string }) {
  const weight = (value: string, places: number) => (
    <>
      {formatWeight(value, { places })}
      <span className="u">{unit}</span>
    </>
  );
  return (
    <div className="grid gap-3">
      <div>
        <GradeTag family={bin.family} name={bin.gradeName} />
      </div>
      <dl className="held-figures">
        <div>
          <dt>holds</dt>
          <dd className="n">{weight(bin.balance, 2)}</dd>
        </div>
        <div>
          <dt>tare</dt>
          <dd className="n">{weight(bin.tare, 2)}</dd>
        </div>
        {bin.sellPoint === null ? null : (
          <div>
            <dt>sell point</dt>
            <dd className="n">{weight(bin.sellPoint, 0)}</dd>
          </div>
        )}
        {bin.place === null ? null : (
          <div>
            <dt>place</dt>
            <dd>{bin.place}</dd>
          </div>
        )}
      </dl>
    </div>
  );
}
