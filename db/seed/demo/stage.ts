import type { outfits } from "@/db/schema";
import { currencyExponent } from "@/lib/arithmetic/money";
import type { Context } from "@/lib/auth/context";
import type { Role } from "@/lib/auth/permissions";
import { newId } from "@/lib/ids";

/** Who acts in the demo, and up to which day. */
export type Stage = { outfit: typeof outfits.$inferSelect; members: Map<Role, { id: string; userId: string; name: string }>; today: string };

/** The context in which a member did something on a day: at the end of a working day, in the same form that a request makes. */
export function contextOn(stage: Stage, role: Role, on: string): Context {
  const member = stage.members.get(role);
  if (!member) throw new Error(`the demo has no ${role}`);
  const { outfit } = stage;
  return {
    outfit: { ...outfit, exponent: currencyExponent(outfit.currency) },
    actor: { memberId: member.id, userId: member.userId, name: member.name, role, apiKeyId: null },
    requestId: newId(),
    now: new Date(`${on}T20:30:00Z`),
    today: on,
    idempotency: null,
    ifMatch: null,
    replayed: false,
  };
}
