import { route } from "@/lib/http/route";
import { nothingSchema, ticketSchema } from "@/lib/tickets/schema";
import { postTicket } from "@/lib/tickets/service";

export const POST = route({
  permission: "tickets.post",
  summary: "Post a draft into both books",
  body: nothingSchema,
  response: ticketSchema,
  idempotent: true,
  handler: ({ ctx, params }) => postTicket(ctx, params.id ?? ""),
});
