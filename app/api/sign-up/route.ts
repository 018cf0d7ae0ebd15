import { SIGN_UP } from "@/lib/auth/throttle";
import { publicRoute } from "@/lib/http/route";
import { signedUpSchema, signUpSchema } from "@/lib/people/schema";
import { signUp } from "@/lib/people/service";

export const POST = publicRoute({
  permission: "public",
  limit: SIGN_UP,
  summary: "Make a person and their outfit",
  body: signUpSchema,
  response: signedUpSchema,
  status: 201,
  handler: ({ body, now, requestId }) => signUp(body, { now, requestId }),
});
