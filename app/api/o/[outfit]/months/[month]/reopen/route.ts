import { route } from "@/lib/http/route";
import { monthSchema, nothingSchema } from "@/lib/money/schema";
import { reopenMonth } from "@/lib/money/service";

export const POST = route({
  permission: "months.reopen",
  summary: "Open a closed month again",
  body: nothingSchema,
  response: monthSchema,
  idempotent: true,
  handler: ({ ctx, params }) => reopenMonth(ctx, params.month ?? ""),
});
