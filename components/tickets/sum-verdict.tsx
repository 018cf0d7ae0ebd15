import { Verdict } from "@/components/ui/verdict";
import { compare } from "@/lib/arithmetic/decimal";
import { formatMoney, formatPrice, formatWeight } from "@/lib/format";
import type { Money, ReadLine } from "@/lib/tickets/paper";

/** Our check of one line: whether its sums add up, and what they should be where they do not. */
export function SumVerdict({ line, sheetPrice, outfit }: { line: ReadLine; sheetPrice: string | null; outfit: Money }) {
  if (line.net === null || line.amountMinor === null) return <Verdict tone="plain" words="not complete yet" />;
  if (line.netExpected !== null && compare(line.net, line.netExpected) !== 0) {
    return <Verdict tone="bad" words={`the sum gives net ${formatWeight(line.netExpected, { places: 2 })} ${outfit.weightUnit}`} />;
  }
  if (line.amountExpected !== null && line.amountMinor !== line.amountExpected) {
    return (
      <Verdict
        tone="bad"
        mark="sheet"
        words={`the sum gives ${formatMoney(line.amountExpected, outfit.currency)}`}
        amount={formatMoney(line.amountMinor - line.amountExpected, outfit.currency, { sign: true })}
      />
    );
  }
  if (sheetPrice !== null && line.price !== null && compare(line.price, sheetPrice) < 0) {
    return <Verdict tone="bad" mark="sheet" words={`sheet says ${formatPrice(sheetPrice)}`} />;
  }
  return <Verdict tone="ok" words="agrees" />;
}
