import { sheetChangeSchema, sheetSchema } from "@/lib/prices/schema";
import { changeSheet, requireSheet } from "@/lib/prices/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "prices.see",
  summary: "A price sheet with its lines",
  response: sheetSchema,
  handler: ({ ctx, params }) => requireSheet(ctx, params.id ?? ""),
});

export const PATCH = route({
  permission: "prices.change",
  summary: "Type a price sheet again",
  body: sheetChangeSchema,
  response: sheetSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeSheet(ctx, params.id ?? "", body),
});
