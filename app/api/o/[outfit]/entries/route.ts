import { route } from "@/lib/http/route";
import { entryListQuery, entryListSchema } from "@/lib/money/schema";
import { seeEntries } from "@/lib/money/service";

export const GET = route({
  permission: "books.see",
  summary: "The money book, newest first",
  query: entryListQuery,
  response: entryListSchema,
  handler: ({ ctx, query }) => seeEntries(ctx, query),
});
