import { Panel } from "@/components/ui/panel";
import { Verdict } from "@/components/ui/verdict";
import { formatMoney, formatPrice, formatShortDate } from "@/lib/format";
import type { TicketCheck } from "@/lib/tickets/schema";

/** Our check of a kept ticket: its sums, and its prices against the yard's sheet. */
export function TicketVerdict({ check, currency }: { check: TicketCheck; currency: string }) {
  const under = check.lines.filter((line) => line.differenceMinor !== null && line.differenceMinor < 0);
  const compared = check.lines.filter((line) => line.differenceMinor !== null);
  return (
    <Panel title="Our check" sub={compared.length === 0 ? "no sheet to compare with" : `${compared.length} of ${check.lines.length} lines on the sheet`} padded>
      <ul className="grid gap-2">
        {check.sums.length === 0 ? (
          <li>
            <Verdict tone="ok" words="all sums add up" />
          </li>
        ) : null}
        {check.sums.map((sum) => (
          <li key={sum.path}>
            <Verdict tone="bad" mark="sheet" words={sum.message} />
          </li>
        ))}
        {compared.length > 0 && under.length === 0 ? (
          <li>
            <Verdict tone="ok" words="every price is the sheet’s or better" />
          </li>
        ) : null}
        {under.map((line) => (
          <li key={line.line}>
            <Verdict
              tone="bad"
              mark="sheet"
              words={`${line.gradeName}: the sheet of ${line.sheetFrom ? formatShortDate(line.sheetFrom) : ""} says ${formatPrice(line.sheetPrice ?? "0")}`}
              amount={formatMoney(line.differenceMinor ?? 0, currency, { sign: true })}
            />
          </li>
        ))}
      </ul>
    </Panel>
  );
}
