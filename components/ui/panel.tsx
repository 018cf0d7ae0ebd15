import { useId, type ReactNode } from "react";
import { classes } from "./classes";

interface PanelProps {
  title?: ReactNode;
  /** One quiet fact beside the title. */
  sub?: ReactNode;
  /** A link or figure at the far right of the header. */
  end?: ReactNode;
  /** Heading level of the title. */
  level?: 2 | 3;
  /** Pads the body by 16 px; leave off when a table or list runs to the edges. */
  padded?: boolean;
  id?: string;
  className?: string;
  children?: ReactNode;
}

/** A hairline box under a 3 px ink rule: the one container of the ledger. */
export function Panel({ title, sub, end, level = 2, padded = false, id, className, children }: PanelProps) {
  const headingId = useId();
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <section id={id} className={classes("panel", className)} aria-labelledby={title ? headingId : undefined}>
      {title ? (
        <header>
          <Heading id={headingId}>{title}</Heading>
          {sub ? <span className="sub">{sub}</span> : null}
          {end ? <span className="end">{end}</span> : null}
        </header>
      ) : null}
      {padded ? <div className="in">{children}</div> : children}
    </section>
  );
}
