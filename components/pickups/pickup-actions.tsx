"use client";

import { useRouter } from "next/navigation";
import { useRef, useState, useTransition } from "react";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { Panel } from "@/components/ui/panel";
import { ApiProblem } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";
import { sendPickupVoid, sendWorkOut } from "@/lib/pickups/client";

interface PickupActionsProps {
  slug: string;
  id: string;
  number: number;
  mayWeigh: boolean;
  mayWorkOut: boolean;
  mayVoid: boolean;
  /** What is left on the pile, with its unit. */
  left: string;
}

type Asking = "work-out" | "void" | null;

function questionOf(asking: "work-out" | "void", number: number, left: string) {
  if (asking === "void") {
    return {
      title: `Void pickup ${number}?`,
      words: "Its estimate leaves the pile and what was paid is taken back, in both books. The record stays and says void.",
      keep: "Keep pickup",
      go: `Void pickup ${number}`,
    };
  }
  return {
    title: `Is pickup ${number} worked out?`,
    words: `Nothing more will be weighed from it. The ${left} left of the estimate goes to variance, and what is left of its cost to the goods made of it.`,
    keep: "Not yet",
    go: "Mark worked out",
  };
}

/** What can be done with a pickup: weigh from it, mark it worked out, take it back. The last two ask first and say what they do. */
export function PickupActions({ slug, id, number, mayWeigh, mayWorkOut, mayVoid, left }: PickupActionsProps) {
  const router = useRouter();
  const [asking, setAsking] = useState<Asking>(null);
  const [problem, setProblem] = useState<string | null>(null);
  const [sending, setSending] = useState(false);
  const [refreshing, startRefresh] = useTransition();
  const busy = sending || refreshing;
  const key = useRef(newId());
  const ask = (next: Asking) => {
    setProblem(null);
    setAsking(next);
  };
  const run = async (act: typeof sendWorkOut) => {
    if (busy) return;
    setSending(true);
    setProblem(null);
    try {
      await act(slug, id, key.current);
      key.current = newId();
      // The question stands until the page shows the answer, so that nothing can be asked of what is no longer so.
      startRefresh(() => {
        router.refresh();
        setAsking(null);
      });
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      // A refusal is an answer, so the next try is new work; without an answer the key stays.
      if (error.problem.status > 0) key.current = newId();
      setProblem(error.problem.detail);
    } finally {
      setSending(false);
    }
  };
  if (!mayWeigh && !mayWorkOut && !mayVoid) return null;
  const question = asking === null ? null : questionOf(asking, number, left);
  return (
    <div className="grid gap-3">
      <ErrorSummary problems={problem === null ? [] : [{ message: problem }]} />
      {question ? (
        <Panel title={question.title} padded>
          <div className="grid gap-3">
            <p>{question.words}</p>
            <div className="flex flex-wrap gap-3">
              <Button variant="line" onClick={() => ask(null)}>
                {question.keep}
              </Button>
              <Button
                variant={asking === "void" ? "danger" : "filled"}
                aria-busy={busy}
                onClick={() => void run(asking === "void" ? sendPickupVoid : sendWorkOut)}
              >
                {question.go}
              </Button>
            </div>
          </div>
        </Panel>
      ) : (
        <div className="flex flex-wrap gap-3">
          {mayWeigh ? <Button href={`/o/${slug}/bins/weigh-in?pickup=${id}`}>Weigh from it</Button> : null}
          {mayWorkOut ? (
            <Button variant="line" onClick={() => ask("work-out")}>
              Worked out
            </Button>
          ) : null}
          {mayVoid ? (
            <Button variant="line" onClick={() => ask("void")}>
              Void pickup
            </Button>
          ) : null}
        </div>
      )}
    </div>
  );
}
