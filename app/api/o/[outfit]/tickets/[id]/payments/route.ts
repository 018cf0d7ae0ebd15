import { route } from "@/lib/http/route";
import { paymentInputSchema, ticketSchema } from "@/lib/tickets/schema";
import { payTicket } from "@/lib/tickets/service";

export const POST = route({
  permission: "tickets.pay",
  summary: "Record money that the yard paid",
  body: paymentInputSchema,
  response: ticketSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, params, body }) => payTicket(ctx, params.id ?? "", body),
});
