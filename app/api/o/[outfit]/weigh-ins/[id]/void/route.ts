import { nothingSchema, weighInSchema } from "@/lib/bins/schema";
import { voidWeighIn } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const POST = route({
  permission: "weigh-ins.void",
  summary: "Take a weigh-in back out of both books",
  body: nothingSchema,
  response: weighInSchema,
  idempotent: true,
  handler: ({ ctx, params }) => voidWeighIn(ctx, params.id ?? ""),
});
