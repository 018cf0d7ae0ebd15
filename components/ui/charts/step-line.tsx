import { scaleLinear } from "d3-scale";
import { px } from "./numbers";

interface StepSeries {
  /** The name at the line's end, with its last value: "Northgate 4.02". */
  label: string;
  /** Business dates as `2025-11-26` with the price from that day on, oldest first. Values are for drawing only. */
  points: { date: string; value: number }[];
}

interface StepLineProps {
  /** Up to four; the first is drawn heavy. */
  series: StepSeries[];
  /** The first and last day shown. */
  from: string;
  to: string;
  /** Writes a value beside its gridline. */
  formatTick: (value: number) => string;
  summary: string;
}

const width = 318;
const height = 238;
const left = 34;
const right = 218;
const bottom = 214;
const dashes = ["", "6 3", "1.5 3", "10 3 2 3"];
const months = ["Jan", "Feb", "Mar", "Apr", "May", "Jun", "Jul", "Aug", "Sep", "Oct", "Nov", "Dec"];

function dayOf(date: string): number {
  return Date.parse(`${date}T00:00:00Z`) / 86_400_000;
}

/** The first days of the months between two dates. */
function monthStarts(from: string, to: string): { day: number; name: string }[] {
  const starts: { day: number; name: string }[] = [];
  const cursor = new Date(`${from.slice(0, 7)}-01T00:00:00Z`);
  while (cursor.getTime() / 86_400_000 <= dayOf(to)) {
    starts.push({ day: cursor.getTime() / 86_400_000, name: months[cursor.getUTCMonth()]! });
    cursor.setUTCMonth(cursor.getUTCMonth() + 1);
  }
  return starts;
}

/** Heights of the end labels, kept 18 px apart. */
function labelHeights(ends: number[]): number[] {
  const order = ends.map((y, index) => ({ y, index })).sort((a, b) => a.y - b.y);
  const placed: number[] = [];
  let last = -Infinity;
  for (const end of order) {
    last = Math.max(end.y, last + 18);
    placed[end.index] = last;
  }
  return placed;
}

/** Prices as steps: a sheet holds until the next. Lines differ in dash and weight and are named at their ends. */
export function StepLine({ series, from, to, formatTick, summary }: StepLineProps) {
  const drawn = series.filter((one) => one.points.length > 0).slice(0, 4);
  const values = drawn.flatMap((one) => one.points.map((point) => point.value));
  const x = scaleLinear()
    .domain([dayOf(from), Math.max(dayOf(to), dayOf(from) + 1)])
    .range([left, right])
    .clamp(true);
  const y = scaleLinear()
    .domain([Math.min(...values), Math.max(...values)])
    .range([bottom, 10])
    .nice(4);
  const ends = labelHeights(drawn.map((one) => y(one.points.at(-1)!.value)));
  if (drawn.length === 0) return null;
  return (
    <div className="chart scroll" role="group" aria-label="Chart" tabIndex={0}>
      <svg viewBox={`0 0 ${width} ${height}`} width={width} height={height} role="img" aria-label={summary} style={{ maxWidth: "none" }}>
        {y.ticks(4).map((tick) => (
          <g key={tick}>
            <path d={`M${left} ${px(y(tick))}H${right}`} stroke="var(--hair-2)" />
            <text x={left - 6} y={px(y(tick) + 4)} textAnchor="end" className="ax">
              {formatTick(tick)}
            </text>
          </g>
        ))}
        {monthStarts(from, to).map((month, index) => (
          <g key={month.day}>
            {index > 0 ? <path d={`M${px(x(month.day))} 10V219`} stroke="var(--hair)" /> : null}
            <text x={px(x(month.day) + (index > 0 ? 4 : 0))} y="230" className="ax">
              {month.name}
            </text>
          </g>
        ))}
        {drawn.map((one, index) => {
          const [first, ...later] = one.points;
          const path = `M${px(x(dayOf(first!.date)))} ${px(y(first!.value))}${later
            .map((point) => `H${px(x(dayOf(point.date)))}V${px(y(point.value))}`)
            .join("")}H${right}`;
          return (
            <g key={one.label}>
              <path
                d={path}
                fill="none"
                stroke={index === 0 ? "var(--ink)" : "var(--ink-2)"}
                strokeWidth={index === 0 ? 2.4 : 1.6}
                strokeDasharray={dashes[index]}
              />
              {index === 0
                ? later.map((point) => (
                    <rect key={point.date} x={px(x(dayOf(point.date)) - 2.8)} y={px(y(point.value) - 2.8)} width="5.6" height="5.6" fill="var(--ink)" />
                  ))
                : null}
              <text x={right + 8} y={px(ends[index]! + 4)} className="lb" fontWeight={index === 0 ? 700 : 500}>
                {one.label}
              </text>
            </g>
          );
        })}
      </svg>
    </div>
  );
}
