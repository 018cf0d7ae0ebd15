import "next-auth";
import "next-auth/jwt";

declare module "next-auth" {
  interface User {
    id: string;
    sessionVersion: number;
  }
  interface Session {
    user: { id: string; name?: string | null; email?: string | null };
  }
}

declare module "next-auth/jwt" {
  interface JWT {
    sessionVersion?: number;
    /** The same in every token of one session, so that signing out ends all of them. */
    sessionId?: string;
  }
}
