import { personRoute } from "@/lib/http/route";
import { doneSchema, passwordChangeSchema } from "@/lib/people/schema";
import { changePassword } from "@/lib/people/service";

export const POST = personRoute({
  permission: "person",
  summary: "Change the password; ends every session",
  body: passwordChangeSchema,
  response: doneSchema,
  handler: ({ person, body }) => changePassword(person, body),
});
