import { sheetInputSchema, sheetListQuery, sheetListSchema, sheetSchema } from "@/lib/prices/schema";
import { addSheet, seeSheets } from "@/lib/prices/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "prices.see",
  summary: "Price sheets, the latest first",
  query: sheetListQuery,
  response: sheetListSchema,
  handler: ({ ctx, query }) => seeSheets(ctx, query),
});

export const POST = route({
  permission: "prices.add",
  summary: "Add a yard's price sheet",
  body: sheetInputSchema,
  response: sheetSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => addSheet(ctx, body),
});
