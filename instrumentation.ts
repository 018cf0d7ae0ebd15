import { requireWholeEnv } from "@/lib/env";

/** Runs once when the server starts: a wrong or missing setting stops it there, and not at somebody's first click. */
export function register(): void {
  requireWholeEnv();
}
