import { weighInInputSchema, weighInListQuery, weighInListSchema, weighInSchema } from "@/lib/bins/schema";
import { seeWeighIns, weighIn } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "weigh-ins.see",
  summary: "Weigh-ins, newest first",
  query: weighInListQuery,
  response: weighInListSchema,
  handler: ({ ctx, query }) => seeWeighIns(ctx, query),
});

export const POST = route({
  permission: "weigh-ins.make",
  summary: "Put weighed metal into a bin",
  body: weighInInputSchema,
  response: weighInSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => weighIn(ctx, body),
});
