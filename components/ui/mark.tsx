import Link from "next/link";
import { useId } from "react";

/** The mark: a hanging weight on a hatched step. */
export function Mark({ className }: { className?: string }) {
  const pattern = useId();
  return (
    <svg className={className} viewBox="0 0 26 24" width="26" height="24" aria-hidden="true">
      <defs>
        <pattern id={pattern} width="4" height="4" patternUnits="userSpaceOnUse">
          <path d="M-1 5 5-1M-1 1 1-1M3 5l2-2" stroke="currentColor" strokeWidth="1" />
        </pattern>
      </defs>
      <path d="M1 11.5h13.5v6H25v5.5H1z" fill={`url(#${pattern})`} stroke="currentColor" strokeWidth="1.6" />
      <path d="M3 9.5 4.6 3.6h6.3l1.6 5.9z" fill="currentColor" />
      <path d="M6 3.4V1h3.5v2.4" fill="none" stroke="currentColor" strokeWidth="1.5" />
    </svg>
  );
}

/** Mark and name, as the way home. */
export function Brand({ href }: { href: string }) {
  return (
    <Link className="brand" href={href}>
      <Mark />
      <span>Curbweight</span>
    </Link>
  );
}
