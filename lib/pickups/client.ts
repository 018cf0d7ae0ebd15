import { ApiProblem, apiGet, apiSend } from "@/lib/http/fetch";
import type { PickupInput, PickupRecord } from "./schema";

const base = (slug: string) => `/api/o/${slug}/pickups`;

/**
 * Logs a haul. When an earlier try with the same id was booked although its answer never came, that pickup is the answer. Throws ApiProblem.
 */
export async function sendPickup(slug: string, input: PickupInput, idempotencyKey: string): Promise<PickupRecord> {
  try {
    return await apiSend<PickupRecord>(base(slug), { body: input, idempotencyKey });
  } catch (error) {
    if (!(error instanceof ApiProblem) || error.problem.status !== 409 || input.id === undefined) throw error;
    try {
      return await apiGet<PickupRecord>(`${base(slug)}/${input.id}`);
    } catch {
      // It was not booked before, so the first refusal is the one that says what is wrong.
      throw error;
    }
  }
}

/** Marks a haul worked out. Throws ApiProblem. */
export const sendWorkOut = (slug: string, id: string, idempotencyKey: string): Promise<PickupRecord> =>
  apiSend<PickupRecord>(`${base(slug)}/${id}/work-out`, { idempotencyKey });

/** Takes a haul back out of both books. Throws ApiProblem. */
export const sendPickupVoid = (slug: string, id: string, idempotencyKey: string): Promise<PickupRecord> =>
  apiSend<PickupRecord>(`${base(slug)}/${id}/void`, { idempotencyKey });
