import { route } from "@/lib/http/route";
import { invite, seeInvitations } from "@/lib/people/invitations";
import { invitationInputSchema, invitationListSchema, newInvitationSchema } from "@/lib/people/schema";

export const GET = route({
  permission: "members.change",
  summary: "Invitations that still work",
  response: invitationListSchema,
  handler: ({ ctx }) => seeInvitations(ctx),
});

export const POST = route({
  permission: "members.change",
  summary: "Make a link that lets one person join",
  body: invitationInputSchema,
  response: newInvitationSchema,
  status: 201,
  handler: ({ ctx, body }) => invite(ctx, body),
});
