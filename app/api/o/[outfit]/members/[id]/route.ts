import { route } from "@/lib/http/route";
import { doneSchema, memberChangeSchema, memberSchema } from "@/lib/people/schema";
import { changeMember, removeMember } from "@/lib/people/service";

export const PATCH = route({
  permission: "members.change",
  summary: "Give a member another role",
  body: memberChangeSchema,
  response: memberSchema,
  versioned: true,
  handler: ({ ctx, params, body }) => changeMember(ctx, params.id ?? "", body),
});

export const DELETE = route({
  permission: "members.change",
  summary: "Remove a member; their sessions end everywhere",
  response: doneSchema,
  handler: ({ ctx, params }) => removeMember(ctx, params.id ?? ""),
});
