import { route } from "@/lib/http/route";
import { monthSchema, nothingSchema } from "@/lib/money/schema";
import { closeMonth } from "@/lib/money/service";

export const POST = route({
  permission: "months.close",
  summary: "Close a month: nothing more is dated in it",
  body: nothingSchema,
  response: monthSchema,
  idempotent: true,
  handler: ({ ctx, params }) => closeMonth(ctx, params.month ?? ""),
});
