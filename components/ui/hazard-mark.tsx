/** The warning triangle. Give it the hazard's name where no words stand beside it. */
export function HazardMark({ label }: { label?: string }) {
  return (
    <svg className="haz" viewBox="0 0 20 18" role={label ? "img" : undefined} aria-label={label} aria-hidden={label ? undefined : true}>
      <path d="M10 .8 19.4 17.2H.6z" fill="var(--amber)" stroke="var(--amber-ink)" strokeWidth="1.4" strokeLinejoin="miter" />
      <path d="M10 6.2v5.3M10 13.2v1.9" stroke="var(--amber-ink)" strokeWidth="1.9" />
    </svg>
  );
}
