import { GradeTag } from "@/components/ui/tag";
import { LedgerTable, RowHead, Sum, Td, Th } from "@/components/ui/ledger-table";
import { Panel } from "@/components/ui/panel";
import { Perf } from "@/components/ui/perf";
import { sum } from "@/lib/arithmetic/decimal";
import { formatDate, formatMoney, formatMoneyPlain, formatPrice, formatWeight } from "@/lib/format";
import type { Money } from "@/lib/tickets/paper";
import type { Ticket } from "@/lib/tickets/schema";
import { METHOD_WORDS, stateWords } from "./words";

type Props = { ticket: Ticket; outfit: Money; today: string; money: boolean };

const weightOrBlank = (text: string | null) => (text === null ? "" : formatWeight(text));

function Lines({ ticket, outfit, money }: Props) {
  const unit = outfit.weightUnit;
  return (
    <LedgerTable caption={`Lines of ticket ${ticket.number}`} rows="roomy">
      <thead>
        <tr>
          <Th>Yard’s wording, our grade</Th>
          <Th>Bin</Th>
          <Th numeric unit={unit}>
            Gross
          </Th>
          <Th numeric unit={unit}>
            Tare
          </Th>
          <Th numeric unit={unit}>
            Deduct
          </Th>
          <Th numeric unit={unit}>
            Net
          </Th>
          {money ? (
            <>
              <Th numeric unit={outfit.currency}>
                Price
              </Th>
              <Th numeric unit={outfit.currency}>
                Amount
              </Th>
            </>
          ) : null}
        </tr>
      </thead>
      <tbody>
        {ticket.lines.map((line) => (
          <tr key={line.line}>
            <RowHead>
              {line.yardWording ? <span className="wording">{line.yardWording}</span> : null}
              <GradeTag family={line.family} name={line.gradeName} />
              {line.soldAsGradeName ? <small className="mut"> sold as {line.soldAsGradeName}</small> : null}
            </RowHead>
            <Td>{line.binLabel ?? ""}</Td>
            <Td numeric>{weightOrBlank(line.gross)}</Td>
            <Td numeric>{weightOrBlank(line.tare)}</Td>
            <Td numeric>{weightOrBlank(line.deduction)}</Td>
            <Td numeric>
              <b>{formatWeight(line.net)}</b>
            </Td>
            {money ? (
              <>
                <Td numeric>
                  {formatPrice(line.price ?? "0")}
                  <span className="u">/{line.per.replace("-", " ")}</span>
                </Td>
                <Td numeric>
                  <b>{formatMoneyPlain(line.amountMinor ?? 0, outfit.currency)}</b>
                </Td>
              </>
            ) : null}
          </tr>
        ))}
      </tbody>
      <tfoot>
        <tr>
          <RowHead>{ticket.lines.length === 1 ? "1 line" : `${ticket.lines.length} lines`}</RowHead>
          <td colSpan={4} />
          <Td numeric>
            <Sum>{formatWeight(sum(ticket.lines.map((line) => line.net)))}</Sum>
          </Td>
          {money ? (
            <>
              <td />
              <Td numeric>
                <Sum>
                  {formatMoneyPlain(
                    ticket.lines.reduce((total, line) => total + (line.amountMinor ?? 0), 0),
                    outfit.currency,
                  )}
                </Sum>
              </Td>
            </>
          ) : null}
        </tr>
      </tfoot>
    </LedgerTable>
  );
}

/** The paper as it was copied, torn where the yard's paper is torn. */
export function TicketRecord(props: Props) {
  const { ticket, outfit, today, money } = props;
  const extras = [
    ["Tax", ticket.taxMinor],
    ["Fees kept back", ticket.feeMinor === null ? null : 0 - ticket.feeMinor],
    ["Off on the paper", ticket.differenceMinor],
  ] as const;
  return (
    <Panel className="tk">
      <dl className="tk-head">
        {[
          ["Yard", ticket.yardName],
          ["Their ticket", ticket.number],
          ["Weighed", formatDate(ticket.ticketOn, { today })],
          ["State", stateWords(ticket.state)],
        ].map(([name, value]) => (
          <div key={name} className="tk-fact">
            <dt>{name}</dt>
            <dd>{value}</dd>
          </div>
        ))}
      </dl>
      <Perf />
      <Lines {...props} />
      <Perf />
      <div className="tk-stub">
        <div className="tk-fact">
          <small>Paid by</small>
          <b>{ticket.paymentMethod ? METHOD_WORDS[ticket.paymentMethod] : "not said"}</b>
        </div>
        {ticket.note ? (
          <div className="tk-fact">
            <small>Note</small>
            <b>{ticket.note}</b>
          </div>
        ) : null}
        {money
          ? extras.map(([name, minor]) =>
              minor ? (
                <div key={name} className="tk-fact">
                  <small>{name}</small>
                  <b className="n">{formatMoney(minor, outfit.currency, { sign: true })}</b>
                </div>
              ) : null,
            )
          : null}
        {ticket.totalMinor === null ? null : (
          <div className="due">
            <small>Due to us</small>
            <Sum>{formatMoney(ticket.totalMinor, outfit.currency)}</Sum>
          </div>
        )}
      </div>
    </Panel>
  );
}
