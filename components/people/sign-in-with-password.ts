/** Why signing in did not work, in words for the form. */
export type SignInProblem =
  | "Email or password is wrong. Type both again."
  | "Too many tries. Wait 15 minutes, then try again."
  | "The ledger did not answer. Check the signal and try again.";

/** Signs in through next-auth's own routes. Null when it worked: the browser holds the session then. */
export async function signInWithPassword(email: string, password: string): Promise<SignInProblem | null> {
  try {
    const csrf = (await (await fetch("/api/auth/csrf")).json()) as { csrfToken: string };
    const answer = await fetch("/api/auth/callback/credentials", {
      method: "POST",
      headers: { "content-type": "application/x-www-form-urlencoded" },
      body: new URLSearchParams({ csrfToken: csrf.csrfToken, email, password, json: "true" }),
    });
    if (answer.ok) return null;
    const body = (await answer.json().catch(() => ({}))) as { url?: string };
    const why = body.url ? new URL(body.url, window.location.origin).searchParams.get("error") : null;
    return why === "too-many" ? "Too many tries. Wait 15 minutes, then try again." : "Email or password is wrong. Type both again.";
  } catch {
    return "The ledger did not answer. Check the signal and try again.";
  }
}
