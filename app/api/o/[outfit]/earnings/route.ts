import { route } from "@/lib/http/route";
import { earningsQuery, earningsSchema } from "@/lib/money/schema";
import { seeEarnings } from "@/lib/money/service";

export const GET = route({
  permission: "earnings.see",
  summary: "A month: sales by grade, costs, net, and why it changed",
  query: earningsQuery,
  response: earningsSchema,
  handler: ({ ctx, query }) => seeEarnings(ctx, query),
});
