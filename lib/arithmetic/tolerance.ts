import { fixed, type DecimalString } from "./decimal";
import { exact, plain } from "./exact";
import { WEIGHT_PLACES } from "./weight";

/** Accuracy classes of scales, as stamped on them. */
export const SCALE_CLASSES = ["II", "III", "III L", "IIII"] as const;
export type ScaleClass = (typeof SCALE_CLASSES)[number];

/** Up to how many divisions of load a scale may be off by how many; past the last row, by `above`. */
const TABLE: Record<Exclude<ScaleClass, "III L">, { rows: [upTo: number, off: number][]; above: number }> = {
  II: {
    rows: [
      [5_000, 1],
      [20_000, 2],
    ],
    above: 3,
  },
  III: {
    rows: [
      [500, 1],
      [2_000, 2],
      [4_000, 3],
    ],
    above: 5,
  },
  IIII: {
    rows: [
      [50, 1],
      [200, 2],
      [400, 3],
    ],
    above: 5,
  },
};

/** One division for each 500 of load or part of it: that is the whole of class III L. */
const STEP_OF_III_L = 500;

/**
 * How far a scale in use may be off at a load, in the unit of the load and of the division: the maintenance tolerance of NIST Handbook 44, 2.20,
 * Table 6. Throws a RangeError for a negative load or a division that is not above zero.
 */
export function scaleTolerance(reading: { load: DecimalString; division: DecimalString; scaleClass: ScaleClass }): DecimalString {
  const division = exact(reading.division);
  const load = exact(reading.load);
  if (load.lt(0)) throw new RangeError("A load cannot be negative.");
  if (division.lte(0)) throw new RangeError("A scale's division must be above zero.");
  const divisionsOff = () => {
    if (reading.scaleClass === "III L") {
      const step = division.times(STEP_OF_III_L);
      const full = load.divToInt(step);
      const started = load.gt(full.times(step)) ? full.plus(1) : full;
      return started.lt(1) ? exact("1") : started;
    }
    const { rows, above } = TABLE[reading.scaleClass];
    const row = rows.find(([upTo]) => load.lte(division.times(upTo)));
    return exact(String(row ? row[1] : above));
  };
  return fixed(plain(divisionsOff().times(division)), WEIGHT_PLACES);
}
