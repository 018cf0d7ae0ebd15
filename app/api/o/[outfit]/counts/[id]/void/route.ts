import { countSchema, nothingSchema } from "@/lib/bins/schema";
import { voidCount } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const POST = route({
  permission: "counts.void",
  summary: "Take a count back out of both books",
  body: nothingSchema,
  response: countSchema,
  idempotent: true,
  handler: ({ ctx, params }) => voidCount(ctx, params.id ?? ""),
});
