import { countInputSchema, countListQuery, countListSchema, countSchema } from "@/lib/bins/schema";
import { countBin, seeCounts } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "counts.see",
  summary: "Counts, newest first",
  query: countListQuery,
  response: countListSchema,
  handler: ({ ctx, query }) => seeCounts(ctx, query),
});

export const POST = route({
  permission: "counts.make",
  summary: "Weigh a bin to correct the book",
  body: countInputSchema,
  response: countSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => countBin(ctx, body),
});
