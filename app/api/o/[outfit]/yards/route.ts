import { yardInputSchema, yardListQuery, yardListSchema, yardSchema } from "@/lib/prices/schema";
import { addYard, seeYards } from "@/lib/prices/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "yards.see",
  summary: "Yards, those in use first",
  query: yardListQuery,
  response: yardListSchema,
  handler: ({ ctx }) => seeYards(ctx),
});

export const POST = route({
  permission: "yards.change",
  summary: "Add a yard",
  body: yardInputSchema,
  response: yardSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => addYard(ctx, body),
});
