import type { ReactNode } from "react";

interface EmptyStateProps {
  /** What is so: "No tickets yet". */
  title: ReactNode;
  /** What will be here, or what to change. */
  children?: ReactNode;
  /** The one thing to do next. */
  actions?: ReactNode;
  level?: 2 | 3;
}

/** Stands in place of a list that has nothing in it, and says what to do. */
export function EmptyState({ title, children, actions, level = 2 }: EmptyStateProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="empty">
      <Heading>{title}</Heading>
      {children ? <p>{children}</p> : null}
      {actions ? <div className="actions">{actions}</div> : null}
    </div>
  );
}
