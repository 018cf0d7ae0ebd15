import { route } from "@/lib/http/route";
import { ticketInputSchema, ticketListQuery, ticketListSchema, ticketSchema } from "@/lib/tickets/schema";
import { draftTicket, seeTickets } from "@/lib/tickets/service";

export const GET = route({
  permission: "tickets.see",
  summary: "Sale tickets, newest first",
  query: ticketListQuery,
  response: ticketListSchema,
  handler: ({ ctx, query }) => seeTickets(ctx, query),
});

export const POST = route({
  permission: "tickets.draft",
  summary: "Keep the yard's paper as a draft; books nothing",
  body: ticketInputSchema,
  response: ticketSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => draftTicket(ctx, body),
});
