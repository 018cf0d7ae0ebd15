import type { ReactNode } from "react";
import { Panel } from "@/components/ui/panel";
import { formatDate, formatMoney, formatWeight } from "@/lib/format";

type Line = { occurredOn: string; kind: string; reversal: boolean };
type WeightLine = Line & { movementId: string; place: string; quantity: string };
type MoneyLine = Line & { entryId: string; account: string; amountMinor: number };

const KIND_NAME: Record<string, string> = { pickup: "Logged", "work-out": "Worked out" };

/** "Logged, taken back". */
const headOf = ({ kind, reversal }: Line) => `${KIND_NAME[kind] ?? kind}${reversal ? ", taken back" : ""}`;

interface RecordListProps<T extends Line> {
  lines: T[];
  idOf: (line: T) => string;
  name: (line: T) => string;
  figure: (line: T) => ReactNode;
  today: string;
}

function RecordList<T extends Line>({ lines, idOf, name, figure, today }: RecordListProps<T>) {
  const ids = [...new Set(lines.map(idOf))];
  return (
    <ul className="book-lines">
      {ids.map((id) => {
        const own = lines.filter((line) => idOf(line) === id);
        const [first] = own;
        return (
          <li key={id}>
            <h3>{first ? `${headOf(first)}, ${formatDate(first.occurredOn, { today })}` : null}</h3>
            <dl>
              {own.map((line, index) => (
                <div key={index} className="contents">
                  <dt>{name(line)}</dt>
                  <dd className="n">{figure(line)}</dd>
                </div>
              ))}
            </dl>
          </li>
        );
      })}
    </ul>
  );
}

interface PickupBooksProps {
  weight: WeightLine[];
  /** Null for those who may not see the money book. */
  money: MoneyLine[] | null;
  unit: string;
  currency: string;
  today: string;
}

/** What both books have about this haul, record by record. Every record sums to zero. */
export function PickupBooks({ weight, money, unit, currency, today }: PickupBooksProps) {
  return (
    <>
      <Panel title="In the weight book" sub={unit} padded>
        <RecordList
          lines={weight}
          idOf={(line) => line.movementId}
          name={(line) => line.place}
          figure={(line) => formatWeight(line.quantity, { sign: true })}
          today={today}
        />
      </Panel>
      {money === null ? null : (
        <Panel title="In the money book" sub={currency} padded>
          {money.length === 0 ? (
            <p>Nothing was paid for it, so the money book has no record.</p>
          ) : (
            <RecordList
              lines={money}
              idOf={(line) => line.entryId}
              name={(line) => line.account}
              figure={(line) => formatMoney(line.amountMinor, currency, { sign: true })}
              today={today}
            />
          )}
        </Panel>
      )}
    </>
  );
}
