import { compare, isNegative, isPositive, isZero, min, multiply, divide, negate, subtract, sum, type DecimalString } from "@/lib/arithmetic/decimal";
import { drawCost, issue, type StockState } from "@/lib/arithmetic/average";
import { addMinor } from "@/lib/arithmetic/money";
import { convertWeight, netWeight, type WeightUnit } from "@/lib/arithmetic/weight";
import type { MovementLine, Posting } from "@/lib/books/booking";

export type TypedDraw = { gross: DecimalString; tare: DecimalString };

/** Sums of the draws in the book unit: gross and tare are each converted once, and net is their difference. */
export function weighed(draws: TypedDraw[], unit: WeightUnit, bookUnit: "lb" | "kg"): { gross: DecimalString; tare: DecimalString; net: DecimalString } {
  const gross = convertWeight(sum(draws.map((draw) => draw.gross)), unit, bookUnit);
  const tare = convertWeight(sum(draws.map((draw) => draw.tare)), unit, bookUnit);
  return { gross, tare, net: netWeight({ gross, tare }) };
}

/** A single weight is typed below this; converted or added up it must still be. Far above any scale, far below what a column holds. */
const BOOK_LIMIT: DecimalString = "10000000";

/** Whether a weight in the book unit is one that the book takes. */
export const fitsTheBook = (weight: DecimalString): boolean => compare(weight, BOOK_LIMIT) < 0;

/** What is wrong with the draws, by the path of the field; empty when nothing is. */
export function drawProblems(draws: TypedDraw[], several: boolean): { path: string; message: string }[] {
  return draws.flatMap((draw, index) => {
    const at = several ? `draws.${index}.` : "";
    const net = subtract(draw.gross, draw.tare);
    if (isNegative(net)) return [{ path: `${at}tare`, message: "Tare is more than gross. Weigh again, or look at the container's tare." }];
    if (isZero(net)) return [{ path: `${at}gross`, message: "Gross must be more than tare: nothing would go into the bin." }];
    return [];
  });
}

export type Lot = { pickupId: string; remainingWeight: DecimalString; remainingCostMinor: number };

/**
 * A weigh-in in both books. The net is drawn from the lots, one after another; what is more than they hold was never in an estimate and comes
 * from variance. A lot gives its remaining cost in the share that is drawn of it, all of it when it is emptied. With no lots the metal comes
 * from outside at no cost.
 */
export function weighInBooking(weighIn: { binId: string; gradeId: string; net: DecimalString; lots: Lot[] | null }): {
  lines: MovementLine[];
  postings: Posting[];
} {
  const { binId, gradeId, net, lots } = weighIn;
  const into: MovementLine = { place: "bin", binId, gradeId, quantity: net };
  if (lots === null) return { lines: [{ place: "outside", quantity: negate(net) }, into], postings: [] };
  let left = net;
  const lines: MovementLine[] = [];
  const postings: Posting[] = [];
  for (const lot of lots) {
    // The last of several lots may be emptied by weight that is not there any more; a single one gives its cost all the same.
    if (!isPositive(left)) break;
    const drawn = min(left, lot.remainingWeight);
    const emptied = compare(left, lot.remainingWeight) >= 0;
    const costMinor = emptied ? lot.remainingCostMinor : drawCost(lot.remainingCostMinor, drawn, lot.remainingWeight);
    left = subtract(left, drawn);
    lines.push({ place: "pile", pickupId: lot.pickupId, quantity: negate(drawn) });
    postings.push({ account: "scrap-stock", amountMinor: -costMinor, pickupId: lot.pickupId });
  }
  lines.push({ place: "variance", quantity: negate(left) }, into);
  const cost = addMinor(...postings.map((posting) => posting.amountMinor));
  return { lines, postings: [...postings, { account: "scrap-stock", amountMinor: 0 - cost, gradeId }] };
}

/** A count in both books: less than the book is a loss at the moving average, more is a gain at the same average. */
export function countBooking(count: { binId: string; gradeId: string; difference: DecimalString; stock: StockState }): {
  lines: MovementLine[];
  postings: Posting[];
} {
  const { binId, gradeId, difference, stock } = count;
  const costMinor = isNegative(difference) ? -issue(stock, negate(difference)).costMinor : gainCost(stock, difference);
  return {
    lines: [
      { place: "bin", binId, gradeId, quantity: difference },
      { place: "variance", gradeId, quantity: negate(difference) },
    ],
    postings: [
      { account: "scrap-stock", amountMinor: costMinor, gradeId },
      { account: "stock-loss", amountMinor: 0 - costMinor, gradeId },
    ],
  };
}

/** What found metal is worth at the average: C x q / Q, nothing when the grade was empty. */
function gainCost(stock: StockState, quantity: DecimalString): number {
  if (isZero(stock.quantity)) return 0;
  return Number.parseInt(divide(multiply(String(stock.costMinor), quantity, 4), stock.quantity, 0), 10);
}
