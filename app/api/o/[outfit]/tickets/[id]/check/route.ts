import { checkTicket } from "@/lib/tickets/check";
import { route } from "@/lib/http/route";
import { ticketCheckSchema } from "@/lib/tickets/schema";

export const GET = route({
  permission: "tickets.check",
  summary: "A ticket held against its own sums and the yard's sheet",
  response: ticketCheckSchema,
  handler: ({ ctx, params }) => checkTicket(ctx, params.id ?? ""),
});
