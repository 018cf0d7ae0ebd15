import Link from "next/link";

const STATES = [
  ["all", "All"],
  ["draft", "Drafts"],
  ["unpaid", "Unpaid"],
  ["paid", "Paid"],
  ["void", "Void"],
] as const;

/** Which tickets the list shows; kept in the address. */
export function TicketFilters({ slug, state }: { slug: string; state: string }) {
  return (
    <nav aria-label="Which tickets" className="chips sm" style={{ "--cols": STATES.length }}>
      {STATES.map(([value, label]) => (
        <Link
          key={value}
          className="chip"
          href={value === "all" ? `/o/${slug}/tickets` : `/o/${slug}/tickets?state=${value}`}
          aria-current={state === value ? "true" : undefined}
        >
          {label}
        </Link>
      ))}
    </nav>
  );
}
