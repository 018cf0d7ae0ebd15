import { apiSend } from "@/lib/http/fetch";

type Sent = { id: string };

/** Keeps a new draft, or changes the one that was opened. */
export const keepDraft = (slug: string, input: unknown, kept: { id: string; version: number } | null, idempotencyKey: string): Promise<Sent> =>
  kept === null
    ? apiSend<Sent>(`/api/o/${slug}/tickets`, { body: input, idempotencyKey })
    : apiSend<Sent>(`/api/o/${slug}/tickets/${kept.id}`, { method: "PATCH", body: input, ifMatch: kept.version });

/** Posts a draft into both books. */
export const postTicket = (slug: string, id: string, idempotencyKey: string): Promise<Sent> =>
  apiSend<Sent>(`/api/o/${slug}/tickets/${id}/post`, { idempotencyKey });

/** Records money that the yard paid. */
export const payTicket = (slug: string, id: string, input: unknown, idempotencyKey: string): Promise<unknown> =>
  apiSend(`/api/o/${slug}/tickets/${id}/payments`, { body: input, idempotencyKey });

/** Takes a ticket back out of both books. */
export const voidTicket = (slug: string, id: string, idempotencyKey: string): Promise<unknown> =>
  apiSend(`/api/o/${slug}/tickets/${id}/void`, { idempotencyKey });
