import { scaleLinear } from "d3-scale";
import type { ReactNode } from "react";
import { hatchFor, hatchName, hatchOrder, type Hatch } from "../families";
import { HatchRect } from "./hatch-rect";
import { percent, px } from "./numbers";

interface Words {
  label: string;
  /** A quiet line under the label. */
  sub?: string;
  /** The amount as written on the mark: "−$741.86". */
  valueLabel: string;
}

interface WaterfallProps {
  /** Sales, stacked by family. Values are for drawing only, in any one scale. */
  sales: Words & { value: number; parts: { family: string; value: number }[] };
  /** What was taken off, each a positive value; a negative one adds (a fee earned). */
  steps: (Words & { value: number })[];
  /** What was left. It may be below zero. */
  net: Words & { value: number };
  /** The chart in one sentence, for those who do not see it. */
  summary: string;
  /** A line under the chart, such as where its table is. */
  caption?: ReactNode;
}

const top = 32.5;
const height = 306;
const floor = 262;
const barShare = 0.132;

/** Families that share a hatch drawn as one block, the biggest at the bottom. */
function stack(parts: { family: string; value: number }[]): { hatch: Hatch; value: number }[] {
  const sums = new Map<Hatch, number>();
  for (const part of parts) {
    const hatch = hatchFor(part.family);
    sums.set(hatch, (sums.get(hatch) ?? 0) + part.value);
  }
  return hatchOrder
    .map((hatch) => ({ hatch, value: sums.get(hatch) ?? 0 }))
    .filter((block) => block.value > 0)
    .sort((a, b) => b.value - a.value);
}

/** The span each block takes on the scale, from the bottom up. */
function spans(blocks: { hatch: Hatch; value: number }[]): { hatch: Hatch; from: number; to: number }[] {
  let sum = 0;
  return blocks.map(({ hatch, value }) => {
    const from = sum;
    sum += value;
    return { hatch, from, to: sum };
  });
}

/** Label positions at least 15.5 px apart, in the order of the blocks from the top. */
function spread(middles: number[]): number[] {
  const placed: number[] = [];
  middles.forEach((middle, index) => placed.push(index === 0 ? Math.max(middle, 44.5) : Math.max(middle, placed[index - 1]! + 15.5)));
  const over = (placed.at(-1) ?? 0) - (floor - 4);
  return over > 0 ? placed.map((y, index) => Math.min(y, floor - 4 - (placed.length - 1 - index) * 15.5)) : placed;
}

function SalesBar({ blocks, y, base }: { blocks: { hatch: Hatch; value: number }[]; y: (value: number) => number; base: number }) {
  const drawn = spans(blocks).map(({ hatch, from, to }) => ({ hatch, y: y(to), height: y(from) - y(to) }));
  const crest = Math.min(base, ...drawn.map((block) => block.y));
  const fromTop = [...drawn].reverse();
  const labels = spread(fromTop.map((block) => block.y + block.height / 2));
  return (
    <>
      {drawn.map((block) => (
        <HatchRect key={block.hatch} hatch={block.hatch} x="0" y={px(block.y)} width={percent(barShare)} height={px(block.height)} />
      ))}
      <rect x="0" y={px(crest)} width={percent(barShare)} height={px(base - crest)} fill="none" stroke="var(--ink)" strokeWidth="1.2" />
      <svg x={percent(barShare)} overflow="visible">
        {fromTop.map((block, index) => (
          <g key={block.hatch}>
            <path d={`M0 ${px(block.y + block.height / 2)}h5L11 ${px(labels[index]!)}h4`} fill="none" stroke="var(--ink-3)" strokeWidth=".8" />
            <text x="19" y={px(labels[index]! + 4)} className="fl">
              {hatchName[block.hatch]}
            </text>
          </g>
        ))}
      </svg>
    </>
  );
}

function Foot({ middle, label, sub }: { middle: string; label: string; sub?: string }) {
  return (
    <>
      <text x={middle} y="283" className="cat">
        {label}
      </text>
      {sub ? (
        <text x={middle} y="300" className="sb">
          {sub}
        </text>
      ) : null}
    </>
  );
}

/** From sales to net: sales stacked by family, each cost stepping down, and what was left, all from one zero line. */
export function WaterfallBars({ sales, steps, net, summary, caption }: WaterfallProps) {
  const levels = [sales.value];
  for (const step of steps) levels.push(levels.at(-1)! - step.value);
  const y = scaleLinear()
    .domain([Math.min(0, net.value, ...levels), Math.max(1, net.value, ...levels)])
    .range([floor, top]);
  const zero = y(0);
  const firstX = 0.317;
  const gap = (1 - barShare - firstX) / Math.max(steps.length, 1);
  const left = (index: number) => firstX + gap * index;
  const middle = (index: number) => percent(left(index) + barShare / 2);
  const width = percent(barShare);
  return (
    <figure className="chart">
      <div className="scroll" role="group" aria-label="Chart" tabIndex={0}>
        <svg width="100%" height={height} style={{ minWidth: 660 }} role="img" aria-label={summary}>
          <line x1="0" x2="100%" y1={px(zero)} y2={px(zero)} stroke="var(--ink)" />
          <SalesBar blocks={stack(sales.parts)} y={y} base={zero} />
          <text x={percent(barShare / 2)} y={px(y(sales.value) - 8)} className="val">
            {sales.valueLabel}
          </text>
          <Foot middle={percent(barShare / 2)} label={sales.label} sub={sales.sub} />
          {steps.map((step, index) => {
            const from = y(levels[index]!);
            const to = y(levels[index + 1]!);
            return (
              <g key={step.label}>
                <line
                  x1={index === 0 ? width : percent(left(index - 1) + barShare)}
                  x2={percent(left(index) + barShare)}
                  y1={px(from)}
                  y2={px(from)}
                  stroke="var(--ink-3)"
                  strokeDasharray="2 2"
                />
                <rect x={percent(left(index))} y={px(Math.min(from, to))} width={width} height={px(Math.abs(to - from))} fill="var(--panel)" />
                <rect
                  x={percent(left(index))}
                  y={px(Math.min(from, to))}
                  width={width}
                  height={px(Math.abs(to - from))}
                  fill="url(#h-cost)"
                  stroke="var(--ink)"
                  strokeWidth="1.2"
                />
                <text x={middle(index)} y={px(Math.min(from, to) - 8)} className="val">
                  {step.valueLabel}
                </text>
                <Foot middle={middle(index)} label={step.label} sub={step.sub} />
              </g>
            );
          })}
          <line
            x1={percent(left(steps.length - 1) + barShare)}
            x2={percent(1 - barShare)}
            y1={px(y(net.value))}
            y2={px(y(net.value))}
            stroke="var(--ink-3)"
            strokeDasharray="2 2"
          />
          <rect
            x={percent(1 - barShare - 0.001)}
            y={px(Math.min(zero, y(net.value)))}
            width={width}
            height={px(Math.abs(zero - y(net.value)))}
            fill={net.value < 0 ? "url(#h-cost)" : "var(--money)"}
            stroke="var(--ink)"
            strokeWidth="1.2"
          />
          <text x={percent(1 - barShare / 2)} y={px(Math.min(zero, y(net.value)) - 8)} className={net.value < 0 ? "val loss" : "val big"}>
            {net.valueLabel}
          </text>
          <Foot middle={percent(1 - barShare / 2)} label={net.label} sub={net.sub} />
        </svg>
      </div>
      {caption ? <figcaption>{caption}</figcaption> : null}
    </figure>
  );
}
