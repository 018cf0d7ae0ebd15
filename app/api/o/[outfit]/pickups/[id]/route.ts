import { route } from "@/lib/http/route";
import { pickupRecordSchema } from "@/lib/pickups/schema";
import { seePickup } from "@/lib/pickups/service";

export const GET = route({
  permission: "pickups.see",
  summary: "A pickup with its items, weigh-ins and what is left of it",
  response: pickupRecordSchema,
  handler: ({ ctx, params }) => seePickup(ctx, params.id ?? ""),
});
