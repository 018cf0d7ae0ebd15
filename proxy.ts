import { randomBytes } from "node:crypto";
import { NextResponse, type NextRequest } from "next/server";

/** What a page may load: its own files, and no script without this answer's nonce. */
function policyOf(nonce: string): string {
  // The development server's own tools evaluate text; nothing that is shipped does.
  const forTools = process.env.NODE_ENV === "development" ? " 'unsafe-eval'" : "";
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${forTools}`,
    // Charts and tiles carry their measures in style attributes, which no nonce can cover.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join("; ");
}

/** Gives every page its content security policy. It guards nothing else: pages and routes look up who is asking by themselves. */
export function proxy(request: NextRequest): NextResponse {
  const policy = policyOf(randomBytes(16).toString("base64"));
  // Next reads the nonce for its own scripts off the request.
  const headers = new Headers(request.headers);
  headers.set("content-security-policy", policy);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set("content-security-policy", policy);
  if (process.env.NEXTAUTH_URL?.startsWith("https:")) response.headers.set("strict-transport-security", "max-age=31536000; includeSubDomains");
  return response;
}

// The API has a policy of its own (next.config.ts); built files need none.
export const config = { matcher: ["/((?!api/|_next/static/|_next/image).*)"] };
