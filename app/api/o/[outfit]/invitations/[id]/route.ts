import { route } from "@/lib/http/route";
import { revokeInvitation } from "@/lib/people/invitations";
import { doneSchema } from "@/lib/people/schema";

export const DELETE = route({
  permission: "members.change",
  summary: "Take an invitation back",
  response: doneSchema,
  handler: ({ ctx, params }) => revokeInvitation(ctx, params.id ?? ""),
});
