"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { LiveRegion } from "@/components/ui/live-region";
import { ApiProblem, apiSend } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";

interface TakeBackProps {
  /** The record's path in the API, `/api/o/{slug}/weigh-ins/{id}`. */
  path: string;
  /** What is taken back, for those who hear the button and not its row: "12.40 lb in C2-2". */
  what: string;
  voided: boolean;
  /** Whether this member may take it back. */
  may: boolean;
}

/** Takes a weigh-in or a count back out of both books, and says so where the button was. */
export function TakeBack({ path, what, voided, may }: TakeBackProps) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const busy = useRef(false);
  const key = useRef(newId());
  const send = async () => {
    if (busy.current) return;
    busy.current = true;
    setProblem(null);
    try {
      await apiSend(`${path}/void`, { idempotencyKey: key.current });
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      // A refusal is an answer, so the next try is new work; without an answer the key stays.
      if (error.problem.status > 0) key.current = newId();
      setProblem(error.problem.detail);
    } finally {
      busy.current = false;
    }
  };
  if (!voided && !may) return null;
  return (
    <>
      <LiveRegion>{voided ? "taken back" : null}</LiveRegion>
      {voided ? null : (
        <button type="button" className="btn line-b sm" onClick={() => void send()}>
          Undo<span className="vh"> {what}</span>
        </button>
      )}
      {problem ? (
        <p className="err" role="alert">
          {problem}
        </p>
      ) : null}
    </>
  );
}
