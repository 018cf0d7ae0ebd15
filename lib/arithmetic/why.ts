import type { DecimalString } from "./decimal";
import { Fraction } from "./fraction";
import { addMinor, assertSafeMinor } from "./money";

/** A month's sales by grade: the key is the grade's id, quantities are in the book unit. */
export type SalesByGrade = Record<string, { quantity: DecimalString; salesMinor: number }>;

const totalSales = (month: SalesByGrade) => addMinor(...Object.values(month).map((grade) => grade.salesMinor));
const totalQuantity = (month: SalesByGrade) => Object.values(month).reduce((total, grade) => total.plus(Fraction.from(grade.quantity)), Fraction.zero);

/** What now's sales would have come to at the prices before; a grade not sold before counts at its price now. */
function atPricesBefore(before: SalesByGrade, now: SalesByGrade): Fraction {
  return Object.entries(now).reduce((total, [gradeId, { quantity, salesMinor }]) => {
    const earlier = before[gradeId];
    const soldBefore = earlier ? Fraction.from(earlier.quantity) : Fraction.zero;
    if (!earlier || soldBefore.isZero) return total.plus(Fraction.of(salesMinor));
    return total.plus(Fraction.from(quantity).times(Fraction.of(earlier.salesMinor)).over(soldBefore));
  }, Fraction.zero);
}

/**
 * Why sales changed from one month to another, in minor units. Price: the same goods at other prices. Mix: more of the dear or of the cheap
 * grades. Volume: more or less weight. Price and mix are rounded half away from zero; volume takes the remainder, so the three always sum to the
 * change. When nothing was sold before, all of it is volume.
 */
export function whyItChanged(before: SalesByGrade, now: SalesByGrade): { priceMinor: number; mixMinor: number; volumeMinor: number; changeMinor: number } {
  const salesBefore = totalSales(before);
  const salesNow = totalSales(now);
  const changeMinor = addMinor(salesNow, -salesBefore);
  const quantityBefore = totalQuantity(before);
  if (quantityBefore.isZero) return { priceMinor: 0, mixMinor: 0, volumeMinor: changeMinor, changeMinor };
  const expected = atPricesBefore(before, now);
  const averageBefore = Fraction.of(salesBefore).over(quantityBefore);
  const priceMinor = assertSafeMinor(Fraction.of(salesNow).minus(expected).rounded());
  const mixMinor = assertSafeMinor(expected.minus(totalQuantity(now).times(averageBefore)).rounded());
  return { priceMinor, mixMinor, volumeMinor: addMinor(changeMinor, -priceMinor, -mixMinor), changeMinor };
}
