import { route } from "@/lib/http/route";
import { settingsChangeSchema, settingsSchema } from "@/lib/people/schema";
import { changeSettings, seeSettings } from "@/lib/people/service";

export const GET = route({
  permission: "outfit.see",
  summary: "The outfit's settings",
  response: settingsSchema,
  handler: ({ ctx }) => seeSettings(ctx),
});

export const PATCH = route({
  permission: "outfit.change",
  summary: "Change the outfit's settings",
  body: settingsChangeSchema,
  response: settingsSchema,
  versioned: true,
  handler: ({ ctx, body }) => changeSettings(ctx, body),
});
