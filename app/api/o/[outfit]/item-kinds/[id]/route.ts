import { itemKindSheetSchema } from "@/lib/catalogue/schema";
import { requireItemKind } from "@/lib/catalogue/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "catalogue.see",
  summary: "An item kind with its breakdown sheet",
  response: itemKindSheetSchema,
  handler: ({ ctx, params }) => requireItemKind(ctx, params.id ?? ""),
});
