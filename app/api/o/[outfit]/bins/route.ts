import { binInputSchema, binListQuery, binListSchema, binSchema } from "@/lib/bins/schema";
import { addBin, seeBins } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "bins.see",
  summary: "Bins with what they hold, in the order of the grades",
  query: binListQuery,
  response: binListSchema,
  handler: ({ ctx, query }) => seeBins(ctx, query),
});

export const POST = route({
  permission: "bins.change",
  summary: "Add an empty bin",
  body: binInputSchema,
  response: binSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => addBin(ctx, body),
});
