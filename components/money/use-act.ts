"use client";

import { useRouter } from "next/navigation";
import { useRef, useState } from "react";
import { ApiProblem } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";

/**
 * Doing one thing to a record by the press of a button: one request at a time, one key until it is answered, and the page's figures anew
 * afterwards.
 */
export function useAct(act: (idempotencyKey: string) => Promise<unknown>, onDone: () => void) {
  const router = useRouter();
  const [busy, setBusy] = useState(false);
  const [problem, setProblem] = useState<string | null>(null);
  const key = useRef<string | null>(null);
  const run = async () => {
    if (busy) return;
    setBusy(true);
    setProblem(null);
    key.current ??= newId();
    try {
      await act(key.current);
      key.current = null;
      onDone();
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      // A refusal is an answer, so the next try is new work; without an answer the key stays.
      if (error.problem.status > 0) key.current = null;
      setProblem(error.problem.detail);
    } finally {
      setBusy(false);
    }
  };
  return { run, busy, problem };
}
