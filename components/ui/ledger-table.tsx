import Link from "next/link";
import { useId, type ReactNode, type TdHTMLAttributes, type ThHTMLAttributes } from "react";
import { classes } from "./classes";

interface LedgerTableProps {
  /** What the table holds, its source and as-of; read out, and shown unless hidden. */
  caption: ReactNode;
  showCaption?: boolean;
  /** `roomy` rows are 46 px, `mini` 36 px. */
  rows?: "plain" | "roomy" | "mini";
  className?: string;
  children: ReactNode;
}

/** A ruled table of figures in a scroll box of its own, so that a phone scrolls the table and not the page. */
export function LedgerTable({ caption, showCaption = false, rows = "plain", className, children }: LedgerTableProps) {
  const id = useId();
  return (
    <div className="scroll" role="region" aria-labelledby={id} tabIndex={0}>
      <table className={classes("ledger-table", rows !== "plain" && rows, className)}>
        <caption id={id} className={showCaption ? "cap" : "vh"}>
          {caption}
        </caption>
        {children}
      </table>
    </div>
  );
}

/** How a column is sorted now, and what a press on its head does. */
export type Sort = { direction: "ascending" | "descending" | "none" } & ({ onSort: () => void; href?: undefined } | { href: string; onSort?: undefined });

interface ThProps extends Omit<ThHTMLAttributes<HTMLTableCellElement>, "scope"> {
  /** The unit, once, under the head. */
  unit?: string;
  /** Figures stand right-aligned, and so does their head. */
  numeric?: boolean;
  sort?: Sort;
}

const arrow = { ascending: "↑", descending: "↓", none: "" };

/** A column head, with its unit under it and a sort button in it where the table sorts. */
export function Th({ unit, numeric, sort, className, children, ...rest }: ThProps) {
  const words = (
    <>
      {children}
      {sort && sort.direction !== "none" ? (
        <span className="dir" aria-hidden="true">
          {arrow[sort.direction]}
        </span>
      ) : null}
    </>
  );
  return (
    <th {...rest} scope="col" className={classes(numeric && "r", className)} aria-sort={sort?.direction}>
      {sort?.href ? (
        <Link className="sort" href={sort.href} scroll={false}>
          {words}
        </Link>
      ) : sort?.onSort ? (
        <button type="button" className="sort" onClick={sort.onSort}>
          {words}
        </button>
      ) : (
        words
      )}
      {unit ? (
        <>
          <br />
          {unit}
        </>
      ) : null}
    </th>
  );
}

/** The head of a row: the thing the row is about. */
export function RowHead({ className, ...rest }: Omit<ThHTMLAttributes<HTMLTableCellElement>, "scope">) {
  return <th {...rest} scope="row" className={className} />;
}

interface TdProps extends TdHTMLAttributes<HTMLTableCellElement> {
  numeric?: boolean;
  muted?: boolean;
}

/** A cell; figures are right-aligned with tabular digits. */
export function Td({ numeric, muted, className, ...rest }: TdProps) {
  return <td {...rest} className={classes(numeric && "r n", muted && "mut", className)} />;
}

/** A true total of what stands above it: single rule over, double rule under. */
export function Sum({ className, children }: { className?: string; children: ReactNode }) {
  return <span className={classes("sum n", className)}>{children}</span>;
}
