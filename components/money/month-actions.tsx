"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Panel } from "@/components/ui/panel";
import { formatMonth } from "@/lib/format";
import { sendMonth } from "@/lib/money/client";
import { useAct } from "./use-act";

interface MonthActionsProps {
  slug: string;
  month: string;
  verb: "close" | "reopen";
}

/** Closing a month, or opening it again: asks first and says what it does. */
export function MonthActions({ slug, month, verb }: MonthActionsProps) {
  const [asking, setAsking] = useState(false);
  const { run, busy, problem } = useAct(
    (key) => sendMonth(slug, month, verb, key),
    () => setAsking(false),
  );
  const name = formatMonth(month);
  const closing = verb === "close";
  if (!asking)
    return (
      <div>
        <Button variant={closing ? "filled" : "line"} onClick={() => setAsking(true)}>
          {closing ? "Close the month" : "Open the month again"}
        </Button>
      </div>
    );
  return (
    <Panel title={closing ? `Close ${name}?` : `Open ${name} again?`} padded className="full">
      <div className="grid gap-3">
        <ErrorSummary problems={problem === null ? [] : [{ message: problem }]} />
        <p>
          {closing
            ? "Nothing more can be dated in it. A later void or correction is dated in the first open month. Only the owner can open it again."
            : "Records can be dated in it again, and its figures can change. That it was opened stays on record."}
        </p>
        <div className="flex flex-wrap gap-3">
          <Button variant="line" onClick={() => setAsking(false)}>
            {closing ? "Keep it open" : "Keep it closed"}
          </Button>
          <Button aria-busy={busy} onClick={() => void run()}>
            {closing ? `Close ${name}` : `Open ${name}`}
          </Button>
        </div>
      </div>
    </Panel>
  );
}
