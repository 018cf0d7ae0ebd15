import type { ReactNode } from "react";
import { HazardMark } from "./hazard-mark";

interface CautionProps {
  /** When it matters: "Before the cover comes off". */
  title: ReactNode;
  /** Plain sentences, the worst first. */
  lines: readonly string[];
  level?: 2 | 3;
  /** Anything that must be done about it, such as a statement to attach. */
  children?: ReactNode;
}

/** A hazard, stated before the work. It cannot be dismissed, and it never passes for legal advice. */
export function Caution({ title, lines, level = 2, children }: CautionProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <section className="caution">
      <i className="stripes" aria-hidden="true" />
      <div className="body">
        <Heading className="caution-head">
          <HazardMark label="Hazard" />
          <span>{title}</span>
        </Heading>
        <ul>
          {lines.map((line) => (
            <li key={line}>{line}</li>
          ))}
        </ul>
        {children}
        <p className="law">Local rules and licensed practice come first.</p>
      </div>
    </section>
  );
}
