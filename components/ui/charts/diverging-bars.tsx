import type { ReactNode } from "react";
import { percent } from "./numbers";

interface Effect {
  label: string;
  /** A quiet line under the label: "361.1 lb more sold". */
  sub?: string;
  /** For drawing only; up is right of the line. */
  value: number;
  /** The amount with its sign: "+$183.26". */
  valueLabel: string;
}

interface DivergingBarsProps {
  /** Where it started: "October net", "$2,690.73". */
  before?: { label: string; valueLabel: string };
  effects: Effect[];
  /** Where it came out, with the double rule under it. */
  after?: { label: string; valueLabel: ReactNode };
}

/** What moved a figure up or down: one row each, bars about one line in one scale, amounts at the end. The rows are its text. */
export function DivergingBars({ before, effects, after }: DivergingBarsProps) {
  const most = Math.max(0, ...effects.map((effect) => effect.value));
  const least = Math.max(0, ...effects.map((effect) => -effect.value));
  const zero = most + least === 0 ? 0.38 : Math.min(0.62, Math.max(0.38, least / (most + least)));
  const scale = Math.min(most > 0 ? (0.98 - zero) / most : Number.POSITIVE_INFINITY, least > 0 ? (zero - 0.02) / least : Number.POSITIVE_INFINITY);
  const long = (value: number) => (value === 0 ? "0%" : percent(Math.abs(value) * scale));
  return (
    <div className="eff" style={{ "--zero": percent(zero) }}>
      {before ? (
        <p className="be n">
          <span>{before.label}</span>
          <span>{before.valueLabel}</span>
        </p>
      ) : null}
      <ul>
        {effects.map((effect) => (
          <li key={effect.label}>
            <div>
              <b>{effect.label}</b>
              {effect.sub ? <small>{effect.sub}</small> : null}
            </div>
            <span className="eb" aria-hidden="true">
              {effect.value > 0 ? <i className="up" style={{ left: `calc(${percent(zero)} + 1px)`, width: long(effect.value) }} /> : null}
              {effect.value < 0 ? <i className="dn" style={{ right: percent(1 - zero), width: long(effect.value) }} /> : null}
            </span>
            <span className="n">{effect.valueLabel}</span>
          </li>
        ))}
      </ul>
      {after ? (
        <p className="be aft n">
          <span>{after.label}</span>
          <span className="sum money">{after.valueLabel}</span>
        </p>
      ) : null}
    </div>
  );
}
