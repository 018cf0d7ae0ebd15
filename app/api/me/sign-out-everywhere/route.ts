import { personRoute } from "@/lib/http/route";
import { doneSchema } from "@/lib/people/schema";
import { signOutEverywhere } from "@/lib/people/service";

export const POST = personRoute({
  permission: "person",
  summary: "End every session, on every device",
  response: doneSchema,
  handler: ({ person }) => signOutEverywhere(person),
});
