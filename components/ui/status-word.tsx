import type { ReactNode } from "react";
import { classes } from "./classes";

interface StatusWordProps {
  children: ReactNode;
  /** `act` for done and in order, `bad` for what costs something. */
  tone?: "plain" | "quiet" | "act" | "bad";
  /** A box round it, as a stale sheet's age wears. */
  boxed?: boolean;
}

/** A state in one plain word. It is not a button and does not look like one. */
export function StatusWord({ children, tone = "plain", boxed }: StatusWordProps) {
  return <span className={classes("status", tone === "quiet" && "mut", tone === "act" && "ok", tone === "bad" && "bad", boxed && "boxed")}>{children}</span>;
}
