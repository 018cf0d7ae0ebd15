import type { ReactNode } from "react";

interface PageHeadProps {
  title: ReactNode;
  /** One quiet fact about the whole page. */
  fact?: ReactNode;
  /** Buttons; at most one is filled. */
  actions?: ReactNode;
}

/** The head of a desk page: its name, one quiet fact, and what can be done. */
export function PageHead({ title, fact, actions }: PageHeadProps) {
  return (
    <div className="head">
      <h1>{title}</h1>
      {fact ? <p className="fact">{fact}</p> : null}
      {actions ? <div className="actions">{actions}</div> : null}
    </div>
  );
}
