import Link from "next/link";

const PLACES = [
  ["month", "The month", ""],
  ["costs", "Costs", "/costs"],
  ["entries", "Money book", "/entries"],
  ["movements", "Weight book", "/movements"],
  ["check", "Books check", "/books-check"],
] as const;

/** The pages under Money, for those who see all of it. */
export function MoneyNav({ slug, current }: { slug: string; current: (typeof PLACES)[number][0] }) {
  return (
    <nav aria-label="Money" className="chips sm full" style={{ "--cols": PLACES.length }}>
      {PLACES.map(([key, label, path]) => (
        <Link key={key} className="chip" href={`/o/${slug}/money${path}`} aria-current={key === current ? "page" : undefined}>
          {label}
        </Link>
      ))}
    </nav>
  );
}
