import { countSchema } from "@/lib/bins/schema";
import { seeCount } from "@/lib/bins/service";
import { route } from "@/lib/http/route";

export const GET = route({
  permission: "counts.see",
  summary: "A count with what the book said",
  response: countSchema,
  handler: ({ ctx, params }) => seeCount(ctx, params.id ?? ""),
});
