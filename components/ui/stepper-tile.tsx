"use client";

import { classes } from "./classes";
import { HazardMark } from "./hazard-mark";
import { ItemIcon } from "./item-icons";

interface StepperTileProps {
  /** The item kind's key and group, which choose the drawing. */
  kind: string;
  group: string;
  /** The short name on the tile. */
  name: string;
  count: number;
  onChange: (count: number) => void;
  /** The most that can be counted. */
  max?: number;
  /** Names the hazard; the tile then wears the triangle. */
  hazard?: string;
  /** Work on this kind stops until something is on file: the tile wears the stripes. */
  stop?: boolean;
}

/** One item kind to count. Tapping the face adds one; at zero the minus cell is empty. Stands in a `StepperTiles`. */
export function StepperTile(props: StepperTileProps) {
  const { kind, group, name, count, onChange, max = 999, hazard, stop } = props;
  const add = () => onChange(Math.min(max, count + 1));
  return (
    <li className={classes("tile", count > 0 && "on", stop && "stop")}>
      {stop ? <i className="stripes" aria-hidden="true" /> : null}
      <button type="button" className="face" onClick={add}>
        <ItemIcon kind={kind} group={group} />
        <span className="what">
          <b>
            <span className="vh">Add one </span>
            {name}
          </b>
          {hazard ? <HazardMark label={`Hazard: ${hazard}`} /> : null}
        </span>
        <span className="q">
          <span className="vh">, counted </span>
          {count}
        </span>
      </button>
      <button type="button" className="mi" aria-label={`One ${name} fewer`} disabled={count === 0} onClick={() => onChange(Math.max(0, count - 1))}>
        −
      </button>
      <button type="button" className="pl" aria-label={`One ${name} more`} disabled={count >= max} onClick={add}>
        +
      </button>
    </li>
  );
}

/** The grid the tiles stand in. */
export function StepperTiles({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <ul className="tiles" aria-label={label}>
      {children}
    </ul>
  );
}
