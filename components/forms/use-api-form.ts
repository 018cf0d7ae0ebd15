"use client";

import { useCallback, useRef, useState } from "react";
import type * as z from "zod";
import type { FieldError } from "@/lib/http/errors";
import { ApiProblem } from "@/lib/http/fetch";
import { plainErrors } from "@/lib/http/plain-errors";
import { newId } from "@/lib/ids";

type Options<S extends z.ZodType, Answer> = {
  /** The schema the server checks with; the form checks with it first, on submit. */
  schema: S;
  /** Sends the checked input. The key stays the same until the server has answered well, so a second tap books nothing twice. */
  send: (input: z.output<S>, idempotencyKey: string) => Promise<Answer>;
  onDone: (answer: Answer) => void;
};

/**
 * Submitting a form to the API: checks on submit, shows the form's and the server's errors alike, keeps what was typed. `errors` feed the
 * error summary and the fields; an error with an empty path concerns the whole form.
 */
export function useApiForm<S extends z.ZodType, Answer>({ schema, send, onDone }: Options<S, Answer>) {
  const [errors, setErrors] = useState<FieldError[]>([]);
  const [sending, setSending] = useState(false);
  const busy = useRef(false);
  const key = useRef<string | null>(null);
  const sent = useRef("");

  const submit = useCallback(
    async (values: z.input<S>): Promise<void> => {
      if (busy.current) return;
      const parsed = schema.safeParse(values, { reportInput: true });
      if (!parsed.success) {
        setErrors(plainErrors(parsed.error));
        return;
      }
      // Changed input is new work and takes a new key; the same input sent again keeps its key.
      const now = JSON.stringify(parsed.data);
      if (key.current === null || now !== sent.current) key.current = newId();
      sent.current = now;
      busy.current = true;
      setSending(true);
      setErrors([]);
      try {
        const answer = await send(parsed.data, key.current);
        key.current = null;
        onDone(answer);
      } catch (error) {
        if (!(error instanceof ApiProblem)) throw error;
        setErrors(error.problem.errors ?? [{ path: "", message: error.problem.detail }]);
      } finally {
        busy.current = false;
        setSending(false);
      }
    },
    [schema, send, onDone],
  );

  const errorAt = useCallback((path: string) => errors.find((error) => error.path === path)?.message, [errors]);
  return { submit, sending, errors, setErrors, errorAt };
}
