import "server-only";
import { randomUUID } from "node:crypto";
import { cookies, headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { cache } from "react";
import { dateIn, now } from "@/lib/clock";
import type { Context } from "./context";
import { can, type Permission } from "./permissions";
import { memberOf, personOf, type Carrier, type Person } from "./session";

const carrier = async (): Promise<Carrier> => ({ cookies: await cookies(), headers: await headers() }) as unknown as Carrier;

/** The person who is signed in, for pages outside an outfit; null when nobody is. Looked up once a request. */
export const pagePerson = cache(async (): Promise<Person | null> => personOf(await carrier()));

/** The context of a page of an outfit. Sends a signed-out person to sign in; somebody else's outfit does not exist. Looked up once a request. */
export const pageContext = cache(async (slug: string): Promise<Context> => {
  const answer = await memberOf(await carrier(), slug);
  if (answer === "signed-out") redirect(`/sign-in?callbackUrl=${encodeURIComponent(`/o/${slug}`)}`);
  if (answer === "absent") notFound();
  const moment = now();
  return { ...answer, requestId: randomUUID(), now: moment, today: dateIn(answer.outfit.timeZone, moment), idempotency: null, ifMatch: null, replayed: false };
});

/** The context of a page that not every role may see; others get the not-found page. */
export async function pageContextFor(slug: string, permission: Permission): Promise<Context> {
  const ctx = await pageContext(slug);
  if (!can(ctx.actor.role, permission)) notFound();
  return ctx;
}
