import { weighInSchema } from "@/lib/bins/schema";
import { seeWeighIn } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "weigh-ins.see",
  summary: "A weigh-in with its draws as typed",
  response: weighInSchema,
  handler: ({ ctx, params }) => seeWeighIn(ctx, params.id ?? ""),
});
