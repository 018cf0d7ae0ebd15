import { binChangeSchema, binSchema } from "@/lib/bins/schema";
import { changeBin, seeBin } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "bins.see",
  summary: "A bin with what it holds",
  response: binSchema,
  handler: ({ ctx, params }) => seeBin(ctx, params.id ?? ""),
});

export const PATCH = route({
  permission: "bins.change",
  summary: "Change a bin, or put it away when empty",
  body: binChangeSchema,
  response: binSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeBin(ctx, params.id ?? "", body),
});
