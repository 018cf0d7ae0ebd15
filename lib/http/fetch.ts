import type { Problem } from "./errors";

/** A problem that the API answered with: what is wrong and what to do. */
export class ApiProblem extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail);
    this.name = "ApiProblem";
  }
}

const NO_ANSWER: Problem = {
  type: "urn:curbweight:problem:no-answer",
  title: "No answer",
  status: 0,
  detail: "The ledger did not answer. Check the signal and send it again: it is booked once, however often you send it.",
};

async function answerOf<T>(send: () => Promise<Response>): Promise<T> {
  let response: Response;
  try {
    response = await send();
  } catch {
    throw new ApiProblem(NO_ANSWER);
  }
  if (response.status === 204) return undefined as T;
  const body: unknown = await response.json().catch(() => null);
  if (!response.ok) throw new ApiProblem((body as Problem | null) ?? { ...NO_ANSWER, status: response.status });
  return body as T;
}

/** Reads from the API. Throws ApiProblem. */
export const apiGet = <T>(path: string, signal?: AbortSignal): Promise<T> =>
  answerOf<T>(() => fetch(path, { headers: { accept: "application/json" }, ...(signal ? { signal } : {}) }));

/** Sends a change to the API. Throws ApiProblem. The same idempotency key sent again books nothing twice. */
export const apiSend = <T>(
  path: string,
  more: { method?: "POST" | "PATCH" | "DELETE"; body?: unknown; ifMatch?: number; idempotencyKey?: string } = {},
): Promise<T> =>
  answerOf<T>(() =>
    fetch(path, {
      method: more.method ?? "POST",
      headers: {
        "content-type": "application/json",
        ...(more.ifMatch === undefined ? {} : { "if-match": `"${more.ifMatch}"` }),
        ...(more.idempotencyKey === undefined ? {} : { "idempotency-key": more.idempotencyKey }),
      },
      body: JSON.stringify(more.body ?? {}),
    }),
  );
