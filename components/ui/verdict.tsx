import type { ReactNode } from "react";
import { Icon, type IconName } from "./icons";

interface VerdictProps {
  /** `ok` agrees, `bad` costs something, `plain` only states. */
  tone: "ok" | "bad" | "plain";
  /** The words: "short 4.0 lb". */
  words: ReactNode;
  /** What it costs: "−$1.80". */
  amount?: ReactNode;
  /** The mark; a check for ok and a scale for bad unless said. */
  mark?: IconName;
}

const usual: Record<VerdictProps["tone"], IconName | null> = { ok: "check", bad: "scale", plain: null };

/** The outcome of a check: mark, words and amount, never a bare red number. */
export function Verdict({ tone, words, amount, mark }: VerdictProps) {
  const name = mark ?? usual[tone];
  return (
    <span className={tone === "plain" ? "verdict" : `verdict ${tone}`}>
      {name ? <Icon name={name} /> : null}
      <span>
        {words}
        {amount ? <small className="n">{amount}</small> : null}
      </span>
    </span>
  );
}
