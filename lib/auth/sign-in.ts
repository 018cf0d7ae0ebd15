import "server-only";
import { eq } from "drizzle-orm";
import * as z from "zod";
import { database } from "@/db/client";
import { users } from "@/db/schema";
import { AppError } from "@/lib/http/errors";
import { log } from "@/lib/log";
import { normalEmail } from "./email";
import { passwordMatches } from "./password";
import { clearPoints, requirePoints, SIGN_IN_ADDRESS, SIGN_IN_EMAIL, SIGN_IN_PAIR, takePoint } from "./throttle";

const inputSchema = z.object({ email: z.string().min(1).max(254), password: z.string().min(1).max(1024), address: z.string() });

/**
 * The person behind an e-mail and password, or null. Unknown e-mail and wrong password take the same time and answer alike. Throws
 * `too-many` text for next-auth to pass on as the error code when there were too many failures.
 */
export async function signIn(input: Record<keyof z.infer<typeof inputSchema>, unknown>) {
  const parsed = inputSchema.safeParse(input);
  if (!parsed.success) return null;
  const email = normalEmail(parsed.data.email);
  const keys = [
    [SIGN_IN_PAIR, `${email}|${parsed.data.address}`],
    [SIGN_IN_EMAIL, email],
    [SIGN_IN_ADDRESS, parsed.data.address],
  ] as const;
  try {
    for (const [rule, key] of keys) if (key !== "direct") await requirePoints(rule, key);
  } catch (error) {
    if (error instanceof AppError) {
      log.warn({ event: "sign-in-throttled", address: parsed.data.address }, "sign-in throttled");
      throw new Error("too-many");
    }
    throw error;
  }
  const [user] = await database().select().from(users).where(eq(users.email, email));
  if (!(await passwordMatches(user?.passwordHash ?? null, parsed.data.password)) || !user) {
    for (const [rule, key] of keys) if (key !== "direct") await takePoint(rule, key).catch(() => undefined);
    log.warn({ event: "sign-in-failed", address: parsed.data.address }, "sign-in failed");
    return null;
  }
  await clearPoints(SIGN_IN_PAIR, keys[0][1]);
  await clearPoints(SIGN_IN_EMAIL, email);
  log.info({ event: "sign-in", userId: user.id }, "signed in");
  return { id: user.id, name: user.name, email: user.email, sessionVersion: user.sessionVersion };
}
