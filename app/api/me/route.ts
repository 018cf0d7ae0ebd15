import { personRoute } from "@/lib/http/route";
import { meSchema } from "@/lib/people/schema";
import { seeMe } from "@/lib/people/service";

export const GET = personRoute({
  permission: "person",
  summary: "Who is signed in, and their outfits",
  response: meSchema,
  handler: ({ person }) => seeMe(person),
});
