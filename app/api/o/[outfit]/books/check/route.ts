import { route } from "@/lib/http/route";
import { booksCheckSchema } from "@/lib/money/schema";
import { seeBooksCheck } from "@/lib/money/service";

export const GET = route({
  permission: "books.see",
  summary: "The always-true list, and whether the books hold it",
  response: booksCheckSchema,
  handler: ({ ctx }) => seeBooksCheck(ctx),
});
