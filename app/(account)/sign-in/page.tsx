import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { SignInForm } from "@/components/people/sign-in-form";
import { pagePerson } from "@/lib/auth/page";
import { ownPath } from "@/lib/people/own-path";

export const metadata: Metadata = { title: "Sign in" };

/** Signing in; who is signed in already goes on. */
export default async function SignInPage({ searchParams }: { searchParams: Promise<{ callbackUrl?: string | string[] }> }) {
  const { callbackUrl } = await searchParams;
  const next = ownPath(callbackUrl) ?? "/outfits";
  if (await pagePerson()) redirect(next);
  return <SignInForm next={next} />;
}
