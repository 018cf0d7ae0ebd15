import { route } from "@/lib/http/route";
import { memberListSchema } from "@/lib/people/schema";
import { seeMembers } from "@/lib/people/service";

export const GET = route({
  permission: "members.see",
  summary: "Members with their roles",
  response: memberListSchema,
  handler: ({ ctx }) => seeMembers(ctx),
});
