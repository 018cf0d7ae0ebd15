import { route } from "@/lib/http/route";
import { makeApiKey, seeApiKeys } from "@/lib/people/api-keys";
import { apiKeyInputSchema, apiKeyListSchema, newApiKeySchema } from "@/lib/people/schema";

export const GET = route({
  permission: "api-keys.change",
  summary: "API keys in use",
  response: apiKeyListSchema,
  handler: ({ ctx }) => seeApiKeys(ctx),
});

export const POST = route({
  permission: "api-keys.change",
  summary: "Make an API key; it is shown once",
  body: apiKeyInputSchema,
  response: newApiKeySchema,
  status: 201,
  handler: ({ ctx, body }) => makeApiKey(ctx, body),
});
