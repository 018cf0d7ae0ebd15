import Link from "next/link";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { formatDate, formatMoneyPlain } from "@/lib/format";
import type { Entry } from "@/lib/money/schema";
import { documentPath, recordWords } from "./words";

type Posting = Entry["postings"][number];

/** Who and what a posting concerns, each with the way to it where it has a page. */
function About({ posting, slug }: { posting: Posting; slug: string }) {
  const parts = [
    posting.gradeName,
    posting.yardName,
    posting.ticketNumber === null ? null : (
      <Link key="ticket" href={`/o/${slug}/tickets/${posting.ticketId}`}>
        Ticket {posting.ticketNumber}
      </Link>
    ),
    posting.pickupNumber === null ? null : (
      <Link key="pickup" href={`/o/${slug}/pickups/${posting.pickupId}`}>
        Pickup {posting.pickupNumber}
      </Link>
    ),
    posting.memberName,
  ].filter((part) => part !== null);
  return parts.flatMap((part, index) => (index === 0 ? [part] : [", ", part]));
}

interface EntryTableProps {
  slug: string;
  entries: Entry[];
  currency: string;
  today: string;
}

function EntryRows({ entry, slug, currency, today }: { entry: Entry } & Omit<EntryTableProps, "entries">) {
  const path = documentPath(entry, entry.postings.find((posting) => posting.ticketId !== null)?.ticketId ?? null);
  const words = recordWords(entry);
  return (
    <tbody>
      {entry.postings.map((posting, index) => (
        <tr key={posting.line} className={index === 0 ? "first" : undefined}>
          {index === 0 ? (
            <>
              <RowHead className="n">{formatDate(entry.occurredOn, { today })}</RowHead>
              <Td>{path === null ? words : <Link href={`/o/${slug}${path}`}>{words}</Link>}</Td>
            </>
          ) : (
            <>
              <Td />
              <Td />
            </>
          )}
          <Td>{posting.accountName}</Td>
          <Td className="wrap">
            <About posting={posting} slug={slug} />
          </Td>
          <Td numeric>{posting.amountMinor > 0 ? formatMoneyPlain(posting.amountMinor, currency) : ""}</Td>
          <Td numeric>{posting.amountMinor < 0 ? formatMoneyPlain(0 - posting.amountMinor, currency) : ""}</Td>
          <Td muted>{index === 0 ? entry.madeBy.name : ""}</Td>
        </tr>
      ))}
    </tbody>
  );
}

/** Entries of the money book with their postings, newest first. */
export function EntryTable({ entries, ...rest }: EntryTableProps) {
  return (
    <LedgerTable caption="Entries of the money book, newest first" className="book-table">
      <thead>
        <tr>
          <Th>Day</Th>
          <Th>Record</Th>
          <Th>Account</Th>
          <Th>Concerns</Th>
          <Th numeric unit={rest.currency}>
            Debit
          </Th>
          <Th numeric unit={rest.currency}>
            Credit
          </Th>
          <Th>Who</Th>
        </tr>
      </thead>
      {entries.map((entry) => (
        <EntryRows key={entry.id} entry={entry} {...rest} />
      ))}
    </LedgerTable>
  );
}
