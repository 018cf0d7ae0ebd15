import "server-only";
import type { NextAuthOptions } from "next-auth";
import CredentialsProvider from "next-auth/providers/credentials";
import { now } from "@/lib/clock";
import { env } from "@/lib/env";
import { newId } from "@/lib/ids";
import { endSession } from "./session";
import { signIn } from "./sign-in";

/** Thirty days: a driver's phone stays signed in; the version check ends sessions at once when it must. */
const SESSION_SECONDS = 30 * 24 * 3600;

const address = (headers: Record<string, unknown> | undefined): string => {
  const forwarded = headers?.["x-forwarded-for"];
  return env().TRUST_PROXY && typeof forwarded === "string" ? (forwarded.split(",").at(-1)?.trim() ?? "unknown") : "direct";
};

/** next-auth's set-up: e-mail and password, a signed token that carries the person and the version of their sessions. */
export const authOptions = (): NextAuthOptions => ({
  secret: env().NEXTAUTH_SECRET,
  session: { strategy: "jwt", maxAge: SESSION_SECONDS },
  pages: { signIn: "/sign-in", error: "/sign-in" },
  providers: [
    CredentialsProvider({
      name: "password",
      credentials: { email: { label: "Email", type: "email" }, password: { label: "Password", type: "password" } },
      authorize: (credentials, request) => signIn({ email: credentials?.email, password: credentials?.password, address: address(request.headers) }),
    }),
  ],
  callbacks: {
    jwt: ({ token, user }) => (user ? { ...token, sub: user.id, sessionVersion: user.sessionVersion, sessionId: newId() } : token),
    session: ({ session, token }) => ({ ...session, user: { ...session.user, id: token.sub ?? "" } }),
    redirect: ({ url, baseUrl }) => (url.startsWith("/") && !url.startsWith("//") ? `${baseUrl}${url}` : url.startsWith(`${baseUrl}/`) ? url : baseUrl),
  },
  events: {
    signOut: async ({ token }) => {
      if (token.sessionId !== undefined) await endSession(token.sessionId, new Date(now().getTime() + SESSION_SECONDS * 1000));
    },
  },
  logger: { error: () => undefined, warn: () => undefined, debug: () => undefined },
});
