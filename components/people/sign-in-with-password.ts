const WRONG = "Email or password is wrong. Type both again.";
const NO_ANSWER = "The ledger did not answer. Check the signal and try again.";

/** How long to wait, out of the server's `too-many-{seconds}`; null for any other code. */
function waitOf(code: string | null): string | null {
  const seconds = /^too-many-(\d{1,6})$/.exec(code ?? "")?.[1];
  if (seconds === undefined) return null;
  const minutes = Math.ceil(Number.parseInt(seconds, 10) / 60);
  const wait = minutes <= 1 ? "1 minute" : minutes < 120 ? `${minutes} minutes` : `${Math.ceil(minutes / 60)} hours`;
  return `Too many tries. Wait ${wait}, then try again.`;
}

/** Signs in through next-auth's own routes. Null when it worked: the browser holds the session then; else why not, in words for the form. */
export async function signInWithPassword(email: string, password: string): Promise<string | null> {
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
    return waitOf(why) ?? WRONG;
  } catch {
    return NO_ANSWER;
  }
}
