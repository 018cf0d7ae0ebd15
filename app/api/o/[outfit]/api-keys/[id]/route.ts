import { route } from "@/lib/http/route";
import { revokeApiKey } from "@/lib/people/api-keys";
import { doneSchema } from "@/lib/people/schema";

export const DELETE = route({
  permission: "api-keys.change",
  summary: "Take an API key out of use",
  response: doneSchema,
  handler: ({ ctx, params }) => revokeApiKey(ctx, params.id ?? ""),
});
