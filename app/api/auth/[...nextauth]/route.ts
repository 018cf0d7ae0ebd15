import NextAuth from "next-auth";
import type { NextRequest } from "next/server";
import { authOptions } from "@/lib/auth/options";

type RouteContext = { params: Promise<{ nextauth: string[] }> };

// Made at the first request, so that a build needs no secret.
const handler = (request: NextRequest, context: RouteContext): Promise<Response> => NextAuth(authOptions())(request, context) as Promise<Response>;

export { handler as GET, handler as POST };
