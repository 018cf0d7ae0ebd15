"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { ApiProblem } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";
import { postTicket, voidTicket } from "./send-ticket";

type Props = { slug: string; id: string; number: string; state: "draft" | "posted" | "paid" | "void"; mayPost: boolean; mayVoid: boolean; mayChange: boolean };

/** What can be done with a ticket: post a draft, change it, take it back. Taking back asks first and says what it does. */
export function TicketActions({ slug, id, number, state, mayPost, mayVoid, mayChange }: Props) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const [asking, setAsking] = useState(false);
  const [busy, setBusy] = useState(false);
  const key = useRef(newId());
  const run = async (act: (key: string) => Promise<unknown>) => {
    if (busy) return;
    setBusy(true);
    setProblem(null);
    try {
      await act(key.current);
      key.current = newId();
      setAsking(false);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.problem.detail);
    } finally {
      setBusy(false);
    }
  };
  if (state === "void") return null;
  return (
    <div className="grid gap-3">
      <ErrorSummary problems={problem === null ? [] : [{ message: problem }]} />
      <div className="flex flex-wrap gap-4">
        {state === "draft" && mayPost ? (
          <Button aria-busy={busy} onClick={() => void run((idempotencyKey) => postTicket(slug, id, idempotencyKey))}>
            Accept ticket
          </Button>
        ) : null}
        {state === "draft" && mayChange ? (
          <Button variant="line" href={`/o/${slug}/tickets/${id}/edit`}>
            Change draft
          </Button>
        ) : null}
        {mayVoid && !asking ? (
          <Button variant="line" onClick={() => setAsking(true)}>
            Void ticket
          </Button>
        ) : null}
      </div>
      {asking ? (
        <div className="panel">
          <header>
            <h2>Void ticket {number}?</h2>
          </header>
          <div className="in grid gap-3">
            <p>
              {state === "draft"
                ? "Nothing was booked yet. The number can be used again."
                : "The metal goes back into the bins, and the sale and its payments are taken back in both books. The record stays."}
            </p>
            <div className="flex flex-wrap gap-4">
              <Button variant="line" onClick={() => setAsking(false)}>
                Keep ticket
              </Button>
              <Button variant="danger" aria-busy={busy} onClick={() => void run((idempotencyKey) => voidTicket(slug, id, idempotencyKey))}>
                Void ticket {number}
              </Button>
            </div>
          </div>
        </div>
      ) : null}
    </div>
  );
}
