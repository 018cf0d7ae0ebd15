import type { ReactNode } from "react";

/** The stations of the line, in the order the material takes. */
export const stationOrder = ["today", "requests", "pickups", "bench", "bins", "loads", "tickets", "money"] as const;

export type StationKey = (typeof stationOrder)[number];

/** The five that stand in the phone's foot. */
export const footStations: readonly StationKey[] = ["pickups", "bench", "bins", "loads", "tickets"];

/** One station with its live figure. */
export interface Station {
  key: StationKey;
  /** The name on the line, such as "Pickups". */
  name: string;
  href: string;
  /** The figure as shown, already formatted; `0` when there is nothing to do. */
  figure: ReactNode;
  /** The small word after the figure: `new`, `to sort`, `lb`. */
  unit?: string;
  /** A second figure, such as what the bins are worth. Leave it off where money is hidden. */
  second?: ReactNode;
  /** A shorter figure for the foot, where 72 px is all there is. */
  footFigure?: ReactNode;
  /** The unit in the foot; the figure stands alone without it. */
  footUnit?: string;
}
