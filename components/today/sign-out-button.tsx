"use client";

import { signOut } from "next-auth/react";

/** Ends the session on this device and leads to the sign-in page. */
export function SignOutButton() {
  return (
    <button type="button" onClick={() => void signOut({ callbackUrl: "/sign-in" })}>
      Sign out
    </button>
  );
}
