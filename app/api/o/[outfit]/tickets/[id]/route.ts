import { route } from "@/lib/http/route";
import { ticketInputSchema, ticketSchema } from "@/lib/tickets/schema";
import { changeDraft, seeTicket } from "@/lib/tickets/service";

export const GET = route({
  permission: "tickets.see",
  summary: "A sale ticket with its lines and payments",
  response: ticketSchema,
  handler: ({ ctx, params }) => seeTicket(ctx, params.id ?? ""),
});

export const PATCH = route({
  permission: "tickets.draft",
  summary: "Type a draft again",
  body: ticketInputSchema,
  response: ticketSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeDraft(ctx, params.id ?? "", body),
});
