import { isZero, multiply, negate, sum, trim, type DecimalString } from "@/lib/arithmetic/decimal";
import { jointCost } from "@/lib/arithmetic/allocate";
import { WEIGHT_PLACES } from "@/lib/arithmetic/weight";
import { seesCost, seesPrices, type Role } from "@/lib/auth/permissions";
import { PAYING_ACCOUNT } from "@/lib/books/accounts";
import type { MovementLine, Posting } from "@/lib/books/booking";

type BookSides = { lines: MovementLine[]; postings: Posting[] };

/** What a line of a haul puts on the pile: as weighed, or so many of the kind's typical weight. In the book unit. */
export const lineEstimate = (line: { count: number; typicalWeight: DecimalString; weighed?: DecimalString }): DecimalString =>
  line.weighed === undefined ? multiply(line.typicalWeight, String(line.count), WEIGHT_PLACES) : trim(line.weighed);

/** A haul in both books: its estimate comes onto the pile as a lot of its own, and what was paid for it is that lot's cost. */
export function pickupBooking(pickup: {
  pickupId: string;
  estimates: DecimalString[];
  paidMinor: number;
  paidFrom: keyof typeof PAYING_ACCOUNT;
  memberId: string;
}): BookSides {
  const { pickupId, paidMinor, paidFrom, memberId } = pickup;
  const weight = sum(pickup.estimates);
  const payer = paidFrom === "own-pocket" ? { memberId } : {};
  return {
    lines: [
      { place: "outside", quantity: negate(weight) },
      { place: "pile", pickupId, quantity: weight },
    ],
    postings: [
      { account: "scrap-stock", amountMinor: paidMinor, pickupId },
      { account: PAYING_ACCOUNT[paidFrom], amountMinor: 0 - paidMinor, pickupId, ...payer },
    ],
  };
}

/** What was made of a haul: the net of one grade, its best price in force, and what the outfit still holds of it. */
export type Output = { gradeId: string; net: DecimalString; price: DecimalString | null; held: DecimalString };

/**
 * Marking a haul worked out: what is left of its estimate was never there (variance), and what is left of its cost belongs to the goods already
 * made of it, by what they would bring. The share of a grade that is all sold goes to the cost of what was sold; with no goods at all, the rest
 * is a loss.
 */
export function workOutBooking(lot: { pickupId: string; remainingWeight: DecimalString; remainingCostMinor: number; outputs: Output[] }): BookSides {
  const { pickupId, remainingWeight, remainingCostMinor, outputs } = lot;
  const shares = outputs.length === 0 ? [] : jointCost(remainingCostMinor, outputs);
  const taken = outputs.map(({ gradeId, held }, index): Posting => ({
    account: isZero(held) ? "cost-of-scrap-sold" : "scrap-stock",
    amountMinor: shares[index] ?? 0,
    gradeId,
    pickupId,
  }));
  const loss: Posting = { account: "stock-loss", amountMinor: remainingCostMinor, pickupId };
  return {
    lines: [
      { place: "pile", pickupId, quantity: negate(remainingWeight) },
      { place: "variance", quantity: remainingWeight },
    ],
    postings: [{ account: "scrap-stock", amountMinor: 0 - remainingCostMinor, pickupId }, ...(outputs.length === 0 ? [loss] : taken)],
  };
}

/** Whether a member sees what was paid for a haul: the office always, a collector on hauls of their own unless the owner hides money. */
export const seesPaid = (member: { id: string; role: Role }, outfit: { hidesMoney: boolean }, madeBy: string): boolean =>
  seesCost(member.role) || (member.role === "collector" && member.id === madeBy && seesPrices(member.role, outfit.hidesMoney));

/** Why a member may not take this haul back, in words; null when they may. What the books refuse is another matter. */
export function whyNotVoid(member: { id: string; role: Role }, pickup: { madeBy: string; state: "open" | "worked-out" | "void" }): string | null {
  if (member.role !== "collector") return null;
  if (member.id !== pickup.madeBy) return "You may void only hauls that you logged yourself. Ask the owner.";
  if (pickup.state === "worked-out") return "This haul is worked out. Ask the owner to void it.";
  return null;
}
