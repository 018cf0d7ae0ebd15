import Link from "next/link";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { StatusWord } from "@/components/ui/status-word";
import { GradeTag } from "@/components/ui/tag";
import { roundTo } from "@/lib/arithmetic/decimal";
import { formatAge, formatPrice, formatShortDate } from "@/lib/format";
import type { Prices, Quote } from "@/lib/prices/schema";

type Props = { prices: Prices; currency: string; unit: string; today: string; slug: string };

/** The yards on the sheets, in the order of their names, with their sheet's date and age. */
function yardsOf(prices: Prices): Quote[] {
  const yards = new Map<string, Quote>();
  for (const grade of prices.grades) for (const quote of grade.yards) if (!yards.has(quote.yardId)) yards.set(quote.yardId, quote);
  return [...yards.values()].toSorted((a, b) => a.yardName.localeCompare(b.yardName));
}

function PriceCell({ quote, best, unit }: { quote: Quote | undefined; best: boolean; unit: string }) {
  if (!quote) return <td />;
  const shown = quote.normalised === null ? quote.price : roundTo(quote.normalised, 4);
  const price = formatPrice(shown);
  return (
    <Td numeric>
      {best ? (
        <b>
          {price} <span className="best">best</span>
        </b>
      ) : (
        price
      )}
      {quote.normalised === null ? <small className="mut"> each</small> : null}
      {quote.normalised !== null && quote.per !== unit ? (
        <small className="mut quoted">
          {formatPrice(quote.price)} per {quote.per.replace("-", " ")}
        </small>
      ) : null}
    </Td>
  );
}

/** Grade by yard: what each pays today per book unit, the best said in words and in weight of type. */
export function PriceTable({ prices, currency, unit, today, slug }: Props) {
  const yards = yardsOf(prices);
  return (
    <LedgerTable caption={`Prices in force on ${formatShortDate(prices.on, { today })}, in ${currency} per ${unit}`} rows="roomy">
      <thead>
        <tr>
          <Th>Grade</Th>
          {yards.map((yard) => (
            <Th key={yard.yardId} numeric>
              <Link href={`/o/${slug}/prices/sheets/${yard.sheetId}`}>{yard.yardName}</Link>
              <br />
              <span className="font-normal">sheet of {formatShortDate(yard.inForceFrom, { today })}</span>{" "}
              {yard.stale ? (
                <StatusWord boxed>
                  <span className="vh">stale, </span>
                  {formatAge(yard.ageDays)}
                </StatusWord>
              ) : (
                <span className="font-normal">{formatAge(yard.ageDays)}</span>
              )}
            </Th>
          ))}
        </tr>
      </thead>
      <tbody>
        {prices.grades.map((grade) => (
          <tr key={grade.gradeId}>
            <RowHead>
              <GradeTag family={grade.family} name={grade.gradeName} />
            </RowHead>
            {yards.map((yard) => (
              <PriceCell
                key={yard.yardId}
                quote={grade.yards.find((quote) => quote.yardId === yard.yardId)}
                best={grade.best?.yardId === yard.yardId}
                unit={unit}
              />
            ))}
          </tr>
        ))}
      </tbody>
    </LedgerTable>
  );
}
