import "server-only";
import { eq } from "drizzle-orm";
import * as z from "zod";
import { database } from "@/db/client";
import { users } from "@/db/schema";
import { AppError } from "@/lib/http/errors";
import { log } from "@/lib/log";
import { normalEmail } from "./email";
import { passwordMatches } from "./password";
import { clearPoints, isRemembered, remember, returnPoint, SIGN_IN_ADDRESS, SIGN_IN_EMAIL, SIGN_IN_KNOWN, SIGN_IN_PAIR, takePoint } from "./throttle";
import { hashToken } from "./tokens";

const inputSchema = z.object({ email: z.string().min(1).max(254), password: z.string().min(1).max(1024), address: z.string() });

/** What the caller's address is called when no proxy in front is trusted to tell it. */
const NO_ADDRESS = "direct";

/** Counts this try against every limit that applies. Throws the text `too-many-{seconds}`, which next-auth passes on as its error code. */
async function countTry(address: string, keys: { email: string; pair: string }): Promise<void> {
  try {
    await takePoint(SIGN_IN_PAIR, keys.pair);
    if (address !== NO_ADDRESS) await takePoint(SIGN_IN_ADDRESS, address);
    // Somebody who fails from many places must not lock the person out of the place they always sign in from.
    const known = address !== NO_ADDRESS && (await isRemembered(SIGN_IN_KNOWN, keys.pair));
    if (!known) await takePoint(SIGN_IN_EMAIL, keys.email);
  } catch (error) {
    if (!(error instanceof AppError)) throw error;
    log.warn({ event: "sign-in-throttled", address }, "sign-in throttled");
    throw new Error(`too-many-${error.retryAfter ?? 1}`, { cause: error });
  }
}

async function forgetTries(address: string, keys: { email: string; pair: string }): Promise<void> {
  await clearPoints(SIGN_IN_PAIR, keys.pair);
  await clearPoints(SIGN_IN_EMAIL, keys.email);
  if (address === NO_ADDRESS) return;
  await returnPoint(SIGN_IN_ADDRESS, address);
  await remember(SIGN_IN_KNOWN, keys.pair);
}

/**
 * The person behind an e-mail and password, or null. Unknown e-mail and wrong password take the same time and answer alike. Throws an
 * Error with the text `too-many-{seconds}` when there were too many failures.
 */
export async function signIn(input: Record<keyof z.infer<typeof inputSchema>, unknown>) {
  const parsed = inputSchema.safeParse(input);
  if (!parsed.success) return null;
  const { address, password } = parsed.data;
  const email = normalEmail(parsed.data.email);
  // Hashed, so that any e-mail fits the limiter's key and none can be read there.
  const keys = { email: hashToken(email), pair: hashToken(`${email}|${address}`) };
  await countTry(address, keys);
  const [user] = await database().select().from(users).where(eq(users.email, email));
  if (!(await passwordMatches(user?.passwordHash ?? null, password)) || !user) {
    log.warn({ event: "sign-in-failed", address }, "sign-in failed");
    return null;
  }
  await forgetTries(address, keys);
  log.info({ event: "sign-in", userId: user.id }, "signed in");
  return { id: user.id, name: user.name, email: user.email, sessionVersion: user.sessionVersion };
}
