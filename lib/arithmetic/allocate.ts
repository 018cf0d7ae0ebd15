import type { DecimalString } from "./decimal";
import { exact, exactInteger, type ExactNumber } from "./exact";
import { addMinor, assertSafeMinor } from "./money";

function byLargestRemainder(total: number, weights: ExactNumber[]): number[] {
  const all = weights.reduce((sum, weight) => sum.plus(weight), exact("0"));
  const shares = weights.map((weight, index) => {
    const due = weight.times(exactInteger(total));
    const whole = due.divToInt(all);
    return { index, whole: whole.toNumber(), rest: due.minus(whole.times(all)) };
  });
  const left = total - addMinor(...shares.map((share) => share.whole));
  // Sorting keeps equal remainders in their order, so that ties go to the earlier part.
  const first = new Set(
    [...shares]
      .sort((a, b) => b.rest.comparedTo(a.rest))
      .slice(0, left)
      .map((share) => share.index),
  );
  return shares.map((share) => share.whole + (first.has(share.index) ? 1 : 0));
}

function split(totalMinor: number, weights: ExactNumber[]): number[] {
  assertSafeMinor(totalMinor);
  if (weights.length === 0) {
    if (totalMinor !== 0) throw new RangeError("An amount cannot be split into no parts.");
    return [];
  }
  if (weights.some((weight) => weight.lt(0))) throw new RangeError("A part's weight cannot be negative.");
  const usable = weights.every((weight) => weight.isZero()) ? weights.map(() => exact("1")) : weights;
  const parts = byLargestRemainder(Math.abs(totalMinor), usable);
  return totalMinor < 0 ? parts.map((part) => 0 - part) : parts;
}

/**
 * Splits an amount in minor units in proportion to weights, by largest remainder, ties to the earlier part. The parts always sum to the whole.
 * A negative amount splits as the mirror of the positive one. Weights that are all zero make equal parts. Throws a RangeError for a negative
 * weight, or for an amount and no parts.
 */
export const allocate = (totalMinor: number, weights: readonly DecimalString[]): number[] => split(totalMinor, weights.map(exact));

/**
 * Splits the cost of what was taken apart over what it gave: by relative sales value (net x price), or by net weight when no output is worth
 * anything. An output without a price takes no cost while others have one. Nets in one unit, prices per that unit.
 */
export function jointCost(costMinor: number, outputs: readonly { net: DecimalString; price: DecimalString | null }[]): number[] {
  const values = outputs.map((output) => exact(output.net).times(exact(output.price ?? "0")));
  const priced = values.some((value) => !value.isZero());
  return split(costMinor, priced ? values : outputs.map((output) => exact(output.net)));
}
