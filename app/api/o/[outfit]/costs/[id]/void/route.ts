import { route } from "@/lib/http/route";
import { costSchema, nothingSchema } from "@/lib/money/schema";
import { voidCost } from "@/lib/money/service";

export const POST = route({
  permission: "costs.void",
  summary: "Take a cost back out of the money book",
  body: nothingSchema,
  response: costSchema,
  idempotent: true,
  handler: ({ ctx, params }) => voidCost(ctx, params.id ?? ""),
});
