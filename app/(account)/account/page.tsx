import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { PasswordForm } from "@/components/people/password-form";
import { pagePerson } from "@/lib/auth/page";

export const metadata: Metadata = { title: "Your account" };

/** A person's own account. */
export default async function AccountPage() {
  const person = await pagePerson();
  if (!person) redirect("/sign-in?callbackUrl=/account");
  return (
    <div className="account-form">
      <h1>Your account</h1>
      <p>
        {person.name}, {person.email}
      </p>
      <PasswordForm />
    </div>
  );
}
