import { route } from "@/lib/http/route";
import { pickupInputSchema, pickupListQuery, pickupListSchema, pickupRecordSchema } from "@/lib/pickups/schema";
import { logPickup, seePickups } from "@/lib/pickups/service";

export const GET = route({
  permission: "pickups.see",
  summary: "Pickups, newest first",
  query: pickupListQuery,
  response: pickupListSchema,
  handler: ({ ctx, query }) => seePickups(ctx, query),
});

export const POST = route({
  permission: "pickups.make",
  summary: "Log a haul: books the pile, and what was paid for it",
  body: pickupInputSchema,
  response: pickupRecordSchema,
  status: 201,
  idempotent: true,
  handler: ({ ctx, body }) => logPickup(ctx, body),
});
