import { compare, isNegative, isPositive, isZero, min, negate, subtract, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import { issue, type StockState } from "@/lib/arithmetic/average";
import { addMinor, decimalFromMinor } from "@/lib/arithmetic/money";
import { lineAmount, type PriceUnit } from "@/lib/arithmetic/price";
import type { MovementLine, Posting } from "@/lib/books/booking";

export type PaperLine = {
  gross?: DecimalString | null | undefined;
  tare?: DecimalString | null | undefined;
  deduction?: DecimalString | null | undefined;
  net: DecimalString;
  pieces?: number | null | undefined;
  price: DecimalString;
  per: PriceUnit;
  amountMinor: number;
};

export type Paper = { lines: PaperLine[]; taxMinor: number; feeMinor: number; totalMinor: number };

/** A sum of the paper that does not add up: where, what it should give, and in words. */
export type WrongSum = { path: string; expected: string; message: string };

type Terms = { weightUnit: "lb" | "kg"; exponent: number };

const LARGEST_MINOR = 10_000_000_000;

function netProblem(line: PaperLine, index: number, unit: string): WrongSum[] {
  if (line.gross == null) return [];
  const tare = line.tare ?? "0";
  const deduction = line.deduction ?? "0";
  const expected = subtract(subtract(line.gross, tare), deduction);
  if (compare(expected, line.net) === 0) return [];
  if (isNegative(expected)) {
    return [{ path: `lines.${index}.tare`, expected: trim(expected), message: "Tare and deduction are more than the gross. Look at the paper again." }];
  }
  const message = `Gross ${trim(line.gross)} less tare ${trim(tare)} and deduction ${trim(deduction)} is ${trim(expected)} ${unit}, not ${trim(line.net)}.`;
  return [{ path: `lines.${index}.net`, expected: trim(expected), message }];
}

function amountProblem(line: PaperLine, index: number, terms: Terms): WrongSum[] {
  const path = `lines.${index}.amountMinor`;
  if (line.per === "each" && line.pieces == null) return [];
  const money = (minor: number) => decimalFromMinor(minor, terms.exponent);
  const expected = amountOf(line, terms);
  if (expected === line.amountMinor) return [];
  const quantity = line.per === "each" ? `${line.pieces} pieces` : `${trim(line.net)} ${terms.weightUnit}`;
  return [
    { path, expected: String(expected), message: `${quantity} at ${trim(line.price)} per ${line.per} is ${money(expected)}, not ${money(line.amountMinor)}.` },
  ];
}

const amountOf = (line: PaperLine, terms: Terms): number =>
  lineAmount({
    quantity: line.net,
    unit: terms.weightUnit,
    price: line.price,
    per: line.per,
    exponent: terms.exponent,
    ...(line.pieces == null ? {} : { pieces: line.pieces }),
  });

/** What the lines, the tax and the fees of a paper make, in minor units. */
export const totalOf = (paper: Omit<Paper, "totalMinor">): number => addMinor(...paper.lines.map((line) => line.amountMinor), paper.taxMinor, -paper.feeMinor);

/** Lines of a price per piece whose number of pieces is missing: without it there is no sum to check. */
export const missingPieces = (lines: PaperLine[]): number[] => lines.flatMap((line, index) => (line.per === "each" && line.pieces == null ? [index] : []));

/** Whether every amount of a paper is within what the books take. */
export const withinBooks = (paper: Paper, terms: Terms): boolean => {
  try {
    return (
      paper.lines.every((line) => (line.per === "each" && line.pieces == null) || amountOf(line, terms) <= LARGEST_MINOR) &&
      Math.abs(totalOf(paper)) <= LARGEST_MINOR
    );
  } catch (error) {
    if (error instanceof RangeError) return false;
    throw error;
  }
};

/**
 * The sums of a paper that do not add up: gross - tare - deduction = net; net x price = amount, rounded once; lines + tax - fees = total. Used
 * alike by the form while it is typed, by the API before it keeps a ticket, and by the check of a kept one.
 */
export function checkArithmetic(paper: Paper, terms: Terms): WrongSum[] {
  const lines = paper.lines.flatMap((line, index) => [...netProblem(line, index, terms.weightUnit), ...amountProblem(line, index, terms)]);
  const expected = totalOf(paper);
  if (expected === paper.totalMinor) return lines;
  const money = (minor: number) => decimalFromMinor(minor, terms.exponent);
  return [
    ...lines,
    { path: "totalMinor", expected: String(expected), message: `Lines, tax and fees make ${money(expected)}, not ${money(paper.totalMinor)}.` },
  ];
}

export type Held = { binId: string; quantity: DecimalString };
export type Draw = { binId: string; gradeId: string; quantity: DecimalString };

/**
 * From which bins the net of a line leaves: the named bin, or the grade's bins, fullest first. `left` is what the bins hold after the lines
 * before and is lowered here. Gives back how much is missing when they do not hold enough.
 */
export function drawFrom(line: { gradeId: string; binId: string | null; net: DecimalString }, left: Held[]): { draws: Draw[]; missing: DecimalString } {
  const sources = line.binId === null ? [...left].sort((a, b) => compare(b.quantity, a.quantity)) : left.filter((bin) => bin.binId === line.binId);
  const draws: Draw[] = [];
  let missing = line.net;
  for (const source of sources) {
    if (isZero(missing)) break;
    const quantity = min(source.quantity, missing);
    if (!isPositive(quantity)) continue;
    source.quantity = subtract(source.quantity, quantity);
    missing = subtract(missing, quantity);
    draws.push({ binId: source.binId, gradeId: line.gradeId, quantity });
  }
  return { draws, missing };
}

/** The cost of what is sold of each grade: issues at the moving average, one line after another. */
export function costOfSale(lines: { gradeId: string; net: DecimalString }[], stock: Map<string, StockState>): Map<string, number> {
  const costs = new Map<string, number>();
  for (const { gradeId, net } of lines) {
    const before = stock.get(gradeId) ?? { quantity: "0", costMinor: 0 };
    const { state, costMinor } = issue(before, net);
    stock.set(gradeId, state);
    costs.set(gradeId, addMinor(costs.get(gradeId) ?? 0, costMinor));
  }
  return costs;
}

/** A sale in both books: the metal leaves its bins at the yard's net; the yard owes the total; what was sold cost what it cost. */
export function saleBooking(sale: {
  ticketId: string;
  yardId: string;
  draws: Draw[];
  lines: { gradeId: string; net: DecimalString; amountMinor: number }[];
  costs: Map<string, number>;
  taxMinor: number;
  feeMinor: number;
  differenceMinor: number;
  totalMinor: number;
}): { lines: MovementLine[]; postings: Posting[] } {
  const { ticketId, yardId } = sale;
  const about = { yardId, ticketId };
  return {
    lines: [
      ...sale.draws.map(({ binId, gradeId, quantity }): MovementLine => ({ place: "bin", binId, gradeId, quantity: negate(quantity) })),
      ...sale.lines.map(({ gradeId, net }): MovementLine => ({ place: "sold", gradeId, quantity: net })),
    ],
    postings: [
      { account: "owed-by-yards", amountMinor: sale.totalMinor, ...about },
      ...sale.lines.map(({ gradeId, amountMinor }): Posting => ({ account: "scrap-sales", amountMinor: -amountMinor, gradeId, ...about })),
      { account: "sales-tax", amountMinor: -sale.taxMinor, ...about },
      { account: "yard-fees", amountMinor: sale.feeMinor, ...about },
      { account: "rounding", amountMinor: -sale.differenceMinor, ...about },
      ...[...sale.costs].flatMap(([gradeId, costMinor]): Posting[] => [
        { account: "cost-of-scrap-sold", amountMinor: costMinor, gradeId, ...about },
        { account: "scrap-stock", amountMinor: -costMinor, gradeId, ...about },
      ]),
    ],
  };
}

/** Where a payment arrives. */
export const RECEIVING_ACCOUNT = { cash: "cash", check: "bank", transfer: "bank", card: "bank" } as const;

/** Money of a yard in the money book. */
export const paymentPostings = (payment: { amountMinor: number; method: keyof typeof RECEIVING_ACCOUNT; yardId: string; ticketId: string }): Posting[] => [
  { account: RECEIVING_ACCOUNT[payment.method], amountMinor: payment.amountMinor, yardId: payment.yardId, ticketId: payment.ticketId },
  { account: "owed-by-yards", amountMinor: -payment.amountMinor, yardId: payment.yardId, ticketId: payment.ticketId },
];
