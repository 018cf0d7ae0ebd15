import Link from "next/link";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { formatDate, formatWeight } from "@/lib/format";
import type { Movement } from "@/lib/money/schema";
import { documentPath, PLACE_NAME, recordWords } from "./words";

type Line = Movement["lines"][number];

function placeWords({ place, binLabel, pickupNumber }: Line): string {
  if (binLabel !== null) return `${PLACE_NAME[place]} ${binLabel}`;
  return pickupNumber === null ? PLACE_NAME[place] : `${PLACE_NAME[place]}, pickup ${pickupNumber}`;
}

interface MovementTableProps {
  slug: string;
  movements: Movement[];
  unit: string;
  today: string;
}

function MovementRows({ movement, slug, today }: { movement: Movement } & Omit<MovementTableProps, "movements" | "unit">) {
  const path = documentPath(movement, null);
  const words = recordWords(movement);
  return (
    <tbody>
      {movement.lines.map((line, index) => (
        <tr key={line.line} className={index === 0 ? "first" : undefined}>
          {index === 0 ? (
            <>
              <RowHead className="n">{formatDate(movement.occurredOn, { today })}</RowHead>
              <Td>{path === null ? words : <Link href={`/o/${slug}${path}`}>{words}</Link>}</Td>
            </>
          ) : (
            <>
              <Td />
              <Td />
            </>
          )}
          <Td>{placeWords(line)}</Td>
          <Td>{line.gradeName ?? ""}</Td>
          <Td numeric>{formatWeight(line.quantity, { places: 2, sign: true })}</Td>
          <Td muted>{index === 0 ? movement.madeBy.name : ""}</Td>
        </tr>
      ))}
    </tbody>
  );
}

/** Movements of the weight book with their lines, newest first. */
export function MovementTable({ movements, unit, ...rest }: MovementTableProps) {
  return (
    <LedgerTable caption="Movements of the weight book, newest first" className="book-table">
      <thead>
        <tr>
          <Th>Day</Th>
          <Th>Record</Th>
          <Th>Place</Th>
          <Th>Grade</Th>
          <Th numeric unit={unit}>
            Into it
          </Th>
          <Th>Who</Th>
        </tr>
      </thead>
      {movements.map((movement) => (
        <MovementRows key={movement.id} movement={movement} {...rest} />
      ))}
    </LedgerTable>
  );
}
