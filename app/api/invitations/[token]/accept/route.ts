import { SIGN_UP } from "@/lib/auth/throttle";
import { publicRoute } from "@/lib/http/route";
import { acceptInvitation } from "@/lib/people/invitations";
import { acceptedSchema, acceptSchema } from "@/lib/people/schema";

export const POST = publicRoute({
  permission: "public",
  limit: SIGN_UP,
  summary: "Join an outfit by its link",
  body: acceptSchema,
  response: acceptedSchema,
  status: 201,
  handler: ({ params, body, person, now, requestId }) => acceptInvitation(params.token ?? "", body, { person, now, requestId }),
});
