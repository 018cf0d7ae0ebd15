import Link from "next/link";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { StatusWord } from "@/components/ui/status-word";
import { formatDate, formatMoneyPlain, formatWeight, formatWeightUnit } from "@/lib/format";
import type { Pickup } from "@/lib/pickups/schema";
import { kindsInWords, SOURCE_NAME, STATE_NAME } from "./words";

interface PickupListProps {
  slug: string;
  pickups: Pickup[];
  unit: string;
  currency: string;
  today: string;
  /** Whether any of the money may be seen; the column is left out otherwise. */
  money: boolean;
}

const tone = { open: "plain", "worked-out": "quiet", void: "quiet" } as const;

function PickupTable({ slug, pickups, unit, currency, today, money }: PickupListProps) {
  return (
    <LedgerTable caption="Pickups, newest first" rows="roomy">
      <thead>
        <tr>
          <Th numeric>No.</Th>
          <Th>Day</Th>
          <Th>Where from</Th>
          <Th>Items</Th>
          <Th numeric unit={unit}>
            Estimate
          </Th>
          <Th numeric unit={unit}>
            Left
          </Th>
          {money ? (
            <Th numeric unit={currency}>
              Paid
            </Th>
          ) : null}
          <Th>Who</Th>
          <Th>State</Th>
        </tr>
      </thead>
      <tbody>
        {pickups.map((pickup) => (
          <tr key={pickup.id}>
            <RowHead className="r n">
              <Link href={`/o/${slug}/pickups/${pickup.id}`}>{pickup.number}</Link>
            </RowHead>
            <Td className="n">{formatDate(pickup.pickedUpOn, { today })}</Td>
            <Td className="wrap">
              {SOURCE_NAME[pickup.source]}
              {pickup.place === null ? null : <span className="mut">, {pickup.place}</span>}
            </Td>
            <Td className="wrap">{kindsInWords(pickup.kinds)}</Td>
            <Td numeric>{formatWeight(pickup.estimatedWeight)}</Td>
            <Td numeric>{formatWeight(pickup.remainingWeight)}</Td>
            {money ? <Td numeric>{pickup.paidMinor === null ? "–" : formatMoneyPlain(pickup.paidMinor, currency)}</Td> : null}
            <Td>{pickup.madeBy.name}</Td>
            <Td>
              <StatusWord tone={tone[pickup.state]}>{STATE_NAME[pickup.state]}</StatusWord>
            </Td>
          </tr>
        ))}
      </tbody>
    </LedgerTable>
  );
}

function PickupCards({ slug, pickups, unit, today }: PickupListProps) {
  return (
    <ul className="haul-cards">
      {pickups.map((pickup) => (
        <li key={pickup.id}>
          <Link className="haul-card" href={`/o/${slug}/pickups/${pickup.id}`}>
            <b>Pickup {pickup.number}</b>
            <span className="n">{formatWeightUnit(pickup.state === "open" ? pickup.remainingWeight : pickup.estimatedWeight, unit)}</span>
            <span className="what">{kindsInWords(pickup.kinds)}</span>
            <span className="mut">
              {formatDate(pickup.pickedUpOn, { today })}, {SOURCE_NAME[pickup.source].toLowerCase()}
              {pickup.place === null ? "" : `, ${pickup.place}`}
            </span>
            <StatusWord tone={tone[pickup.state]}>{pickup.state === "open" ? "left on the pile" : STATE_NAME[pickup.state].toLowerCase()}</StatusWord>
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** Pickups as a ruled table at the desk and as cards on the phone. */
export function PickupList(props: PickupListProps) {
  return (
    <>
      <div className="panel desk-only">
        <PickupTable {...props} />
      </div>
      <div className="phone-only">
        <PickupCards {...props} />
      </div>
    </>
  );
}
