"use client";

import { signOut } from "next-auth/react";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { apiSend } from "@/lib/http/fetch";
import { passwordChangeSchema } from "@/lib/people/schema";
import { PasswordField } from "./password-field";

type Values = { current: string; next: string };

const leave = () => void signOut({ callbackUrl: "/sign-in" });

/** Changing the password. It ends every session, so the person signs in again with the new one. */
export function PasswordForm() {
  const { register, handleSubmit } = useForm<Values>({ defaultValues: { current: "", next: "" }, shouldFocusError: false });
  const { submit, sending, errors, errorAt } = useApiForm<typeof passwordChangeSchema, unknown>({
    schema: passwordChangeSchema,
    send: (input) => apiSend("/api/me/password", { body: input }),
    onDone: leave,
  });
  return (
    <>
      <form noValidate className="account-form" onSubmit={handleSubmit(submit)}>
        <h2>Change password</h2>
        <p>You are signed out everywhere and sign in again with the new one.</p>
        <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
        <PasswordField id="current" label="Password now" autoComplete="current-password" error={errorAt("current")} {...register("current")} />
        <PasswordField
          id="next"
          label="New password"
          hint="15 letters or more. Three or four words do well."
          autoComplete="new-password"
          error={errorAt("next")}
          {...register("next")}
        />
        <BigButton verb="Change password" busy={sending} />
      </form>
      <form
        className="account-form"
        onSubmit={(event) => {
          event.preventDefault();
          void apiSend("/api/me/sign-out-everywhere").then(leave);
        }}
      >
        <h2>A lost phone</h2>
        <p>End every session, on every device, this one too.</p>
        <button type="submit" className="btn line-b lg">
          Sign out everywhere
        </button>
      </form>
    </>
  );
}
