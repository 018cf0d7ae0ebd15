import { itemKindListQuery, itemKindListSchema } from "@/lib/catalogue/schema";
import { seeItemKinds } from "@/lib/catalogue/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "catalogue.see",
  summary: "Item kinds with what they usually weigh and the hazards they carry",
  query: itemKindListQuery,
  response: itemKindListSchema,
  handler: ({ ctx, query }) => seeItemKinds(ctx, query),
});
