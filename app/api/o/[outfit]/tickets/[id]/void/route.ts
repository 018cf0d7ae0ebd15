import { route } from "@/lib/http/route";
import { nothingSchema, ticketSchema } from "@/lib/tickets/schema";
import { voidTicket } from "@/lib/tickets/service";

export const POST = route({
  permission: "tickets.void",
  summary: "Take a ticket and its payments back out of both books",
  body: nothingSchema,
  response: ticketSchema,
  idempotent: true,
  handler: ({ ctx, params }) => voidTicket(ctx, params.id ?? ""),
});
