import { route } from "@/lib/http/route";
import { costInputSchema, costListQuery, costListSchema, costSchema } from "@/lib/money/schema";
import { addCost, seeCosts } from "@/lib/money/service";

export const GET = route({
  permission: "costs.see",
  summary: "Costs, newest first; collectors and sorters get their own",
  query: costListQuery,
  response: costListSchema,
  handler: ({ ctx, query }) => seeCosts(ctx, query),
});

export const POST = route({
  permission: "costs.make",
  summary: "Record a cost: books it in the money book",
  body: costInputSchema,
  response: costSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => addCost(ctx, body),
});
