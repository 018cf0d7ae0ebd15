import { yardChangeSchema, yardSchema } from "@/lib/prices/schema";
import { changeYard } from "@/lib/prices/service";
import { route } from "@/lib/http/route";

export const PATCH = route({
  permission: "yards.change",
  summary: "Change a yard, or put it out of use",
  body: yardChangeSchema,
  response: yardSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeYard(ctx, params.id ?? "", body),
});
