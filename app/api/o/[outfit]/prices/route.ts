import { pricesQuery, pricesSchema } from "@/lib/prices/schema";
import { seePrices } from "@/lib/prices/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "prices.see",
  summary: "Prices in force on a day: the best for each grade, and every yard's",
  query: pricesQuery,
  response: pricesSchema,
  handler: ({ ctx, query }) => seePrices(ctx, query),
});
