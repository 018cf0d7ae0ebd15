import { apiSend } from "@/lib/http/fetch";
import type { Cost, CostInput, Month } from "./schema";

const base = (slug: string) => `/api/o/${slug}`;

/** Records a cost. Throws ApiProblem. */
export const sendCost = (slug: string, input: CostInput, idempotencyKey: string): Promise<Cost> =>
  apiSend<Cost>(`${base(slug)}/costs`, { body: input, idempotencyKey });

/** Takes a cost back out of the money book. Throws ApiProblem. */
export const sendCostVoid = (slug: string, id: string, idempotencyKey: string): Promise<Cost> =>
  apiSend<Cost>(`${base(slug)}/costs/${id}/void`, { idempotencyKey });

/** Closes a month, or opens it again. Throws ApiProblem. */
export const sendMonth = (slug: string, month: string, verb: "close" | "reopen", idempotencyKey: string): Promise<Month> =>
  apiSend<Month>(`${base(slug)}/months/${month}/${verb}`, { idempotencyKey });
