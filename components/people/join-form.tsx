"use client";

import Link from "next/link";
import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { TextField } from "@/components/ui/field";
import { apiSend } from "@/lib/http/fetch";
import { acceptSchema } from "@/lib/people/schema";
import { PasswordField } from "./password-field";
import { roleWords } from "./role-words";
import type { Role } from "@/lib/auth/permissions";
import { signInWithPassword } from "./sign-in-with-password";

type Values = { name: string; email: string; password: string };
type Props = { token: string; outfitName: string; role: Role; inviter: string; person: { name: string } | null };

/** Joining an outfit by a link: one tap for somebody who is signed in, three fields for somebody new. */
export function JoinForm({ token, outfitName, role, inviter, person }: Props) {
  const router = useRouter();
  const { register, handleSubmit, getValues } = useForm<Values>({ defaultValues: { name: "", email: "", password: "" }, shouldFocusError: false });
  const { submit, sending, errors, errorAt } = useApiForm<typeof acceptSchema, { slug: string }>({
    schema: acceptSchema,
    send: (input) => apiSend(`/api/invitations/${token}/accept`, { body: input }),
    onDone: async ({ slug }) => {
      if (!person) await signInWithPassword(getValues("email"), getValues("password"));
      router.push(`/o/${slug}`);
    },
  });
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  return (
    <form noValidate className="account-form" onSubmit={handleSubmit((values) => submit(person ? {} : { person: values }))}>
      <h1>Join {outfitName}</h1>
      <p>
        {inviter} asks you to join as {roleWords(role).name}: {roleWords(role).may}
      </p>
      <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
      {person ? (
        <p>You are signed in as {person.name}.</p>
      ) : (
        <>
          <TextField id="person.name" label="Your name" autoComplete="name" {...error("person.name")} {...register("name")} />
          <TextField
            id="person.email"
            label="Email"
            type="email"
            inputMode="email"
            autoComplete="username"
            autoCapitalize="none"
            {...error("person.email")}
            {...register("email")}
          />
          <PasswordField
            id="person.password"
            label="Password"
            hint="15 letters or more. Three or four words do well."
            autoComplete="new-password"
            error={errorAt("person.password")}
            {...register("password")}
          />
        </>
      )}
      <BigButton verb="Join" consequence={outfitName} busy={sending} />
      {person ? null : (
        <p className="account-links">
          <Link className="link" href={`/sign-in?callbackUrl=/invitation/${token}`}>
            I have an account: sign in first
          </Link>
        </p>
      )}
    </form>
  );
}
