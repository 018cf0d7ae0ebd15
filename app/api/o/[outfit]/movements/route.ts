import { route } from "@/lib/http/route";
import { movementListQuery, movementListSchema } from "@/lib/money/schema";
import { seeMovements } from "@/lib/money/service";

export const GET = route({
  permission: "books.see",
  summary: "The weight book, newest first",
  query: movementListQuery,
  response: movementListSchema,
  handler: ({ ctx, query }) => seeMovements(ctx, query),
});
