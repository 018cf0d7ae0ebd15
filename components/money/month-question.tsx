"use client";

import { useRouter } from "next/navigation";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Panel } from "@/components/ui/panel";
import { formatMonth } from "@/lib/format";
import { sendMonth } from "@/lib/money/client";
import { useAct } from "./use-act";

interface MonthQuestionProps {
  slug: string;
  month: string;
  verb: "close" | "reopen";
}

/** Asks before a month is closed or opened again, and says what that does. */
export function MonthQuestion({ slug, month, verb }: MonthQuestionProps) {
  const router = useRouter();
  const back = `/o/${slug}/money/${month}`;
  const { run, busy, problem } = useAct(
    (key) => sendMonth(slug, month, verb, key),
    () => router.replace(back),
  );
  const name = formatMonth(month);
  const closing = verb === "close";
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
          <Button variant="line" href={back}>
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
