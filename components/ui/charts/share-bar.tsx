import { hatchColor, hatchFor, hatchOrder, type Hatch } from "../families";
import { HatchRect } from "./hatch-rect";
import { percent, px } from "./numbers";

interface ShareRow {
  /** "Weight" or "Value". */
  label: string;
  /** One value for each part of `parts`, for drawing only. */
  values: number[];
}

interface ShareBarProps {
  /** The families, in any order; those that share a hatch are drawn as one. */
  families: string[];
  upper: ShareRow;
  /** The second bar; ribbons join the same family above and below. Leave it off where money is hidden. */
  lower?: ShareRow;
  /** The chart in one sentence. */
  summary: string;
}

interface Block {
  hatch: Hatch;
  from: number;
  to: number;
}

function layOut(families: string[], values: number[]): Block[] {
  const whole = values.reduce((sum, value) => sum + value, 0) || 1;
  let from = 0;
  return hatchOrder.map((hatch) => {
    const value = families.reduce((sum, family, i) => (hatchFor(family) === hatch ? sum + (values[i] ?? 0) : sum), 0);
    const block = { hatch, from, to: from + value / whole };
    from = block.to;
    return block;
  });
}

function Row({ blocks }: { blocks: Block[] }) {
  return (
    <svg className="bars" height="22" aria-hidden="true">
      {blocks
        .filter((block) => block.to > block.from)
        .map((block) => (
          <HatchRect key={block.hatch} hatch={block.hatch} x={percent(block.from)} y={0} width={percent(block.to - block.from)} height={22} />
        ))}
    </svg>
  );
}

/** Shares of a whole by family: weight above, value below, ribbons between, patterns at their own size. */
export function ShareBar({ families, upper, lower, summary }: ShareBarProps) {
  const above = layOut(families, upper.values);
  const below = lower ? layOut(families, lower.values) : null;
  return (
    <div className="chart share" role="img" aria-label={summary}>
      <span className="nm" aria-hidden="true">
        {upper.label}
      </span>
      <Row blocks={above} />
      {lower && below ? (
        <>
          <svg className="ribbons" viewBox="0 0 1000 22" preserveAspectRatio="none" aria-hidden="true">
            {above.map((block, index) => {
              const under = below[index]!;
              const [a, b, c, d] = [block.from, block.to, under.to, under.from].map((share) => px(share * 1000));
              return <path key={block.hatch} d={`M${a} 0L${b} 0L${c} 22L${d} 22Z`} fill={hatchColor(block.hatch)} opacity=".16" />;
            })}
          </svg>
          <span className="nm" aria-hidden="true">
            {lower.label}
          </span>
          <Row blocks={below} />
        </>
      ) : null}
    </div>
  );
}
