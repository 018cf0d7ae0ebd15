import { add, compare, isNegative, isZero, subtract, type DecimalString } from "./decimal";
import { exact, exactInteger, roundedQuotient } from "./exact";
import { addMinor, assertSafeMinor } from "./money";

/** What is held of a grade, and what it cost in minor units. Neither is ever negative. */
export type StockState = { quantity: DecimalString; costMinor: number };

function requireNotNegative(quantities: DecimalString[], costMinor: number): void {
  if (quantities.some(isNegative)) throw new RangeError("A quantity cannot be negative.");
  if (assertSafeMinor(costMinor) < 0) throw new RangeError("A cost cannot be negative.");
}

/** Stock after a receipt: quantity and cost both grow. Throws a RangeError for a negative quantity or cost. */
export function receive(state: StockState, quantity: DecimalString, costMinor: number): StockState {
  requireNotNegative([state.quantity, quantity], state.costMinor);
  requireNotNegative([], costMinor);
  return { quantity: add(state.quantity, quantity), costMinor: addMinor(state.costMinor, costMinor) };
}

/**
 * The cost that goes with drawing `part` of `whole`: round(cost x part / whole). A draw of all or more takes all, so that what is drawn in any
 * number of steps costs what was paid, no more and no less. Throws a RangeError for negative inputs.
 */
export function drawCost(costMinor: number, part: DecimalString, whole: DecimalString): number {
  requireNotNegative([part, whole], costMinor);
  if (isZero(part)) return 0;
  if (compare(part, whole) >= 0) return costMinor;
  return roundedQuotient(exactInteger(costMinor).times(exact(part)), exact(whole), 0).toNumber();
}

/**
 * Stock after an issue at moving average, and what the issue costs: round(C x q / Q); the issue that empties the stock takes all of C. Throws a
 * RangeError when more is issued than is held.
 */
export function issue(state: StockState, quantity: DecimalString): { state: StockState; costMinor: number } {
  if (compare(quantity, state.quantity) > 0) throw new RangeError("More cannot be issued than is held.");
  const costMinor = drawCost(state.costMinor, quantity, state.quantity);
  return { state: { quantity: subtract(state.quantity, quantity), costMinor: state.costMinor - costMinor }, costMinor };
}
