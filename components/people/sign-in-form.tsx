"use client";

import Link from "next/link";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { BigButton } from "@/components/ui/button";
import { ErrorSummary, type Problem } from "@/components/ui/error-summary";
import { TextField } from "@/components/ui/field";
import { PasswordField } from "./password-field";
import { signInWithPassword } from "./sign-in-with-password";

type Values = { email: string; password: string };

/** Signing in with e-mail and password. Afterwards the whole page is loaded anew, so that nothing of an earlier person stays. */
export function SignInForm({ next }: { next: string }) {
  const { register, handleSubmit } = useForm<Values>({ defaultValues: { email: "", password: "" }, shouldFocusError: false });
  const [problems, setProblems] = useState<Problem[]>([]);
  const [attempt, setAttempt] = useState(0);
  const [busy, setBusy] = useState(false);
  const send = async ({ email, password }: Values) => {
    if (busy) return;
    const missing: Problem[] = [
      ...(email.trim() === "" ? [{ field: "email", message: "Enter your email." }] : []),
      ...(password === "" ? [{ field: "password", message: "Enter your password." }] : []),
    ];
    setBusy(true);
    const wrong =
      missing.length > 0
        ? missing
        : await signInWithPassword(email, password).then((problem) => (problem === null ? [] : [{ field: "email", message: problem }]));
    if (wrong.length === 0) {
      window.location.assign(next);
      return;
    }
    setProblems(wrong);
    setAttempt(attempt + 1);
    setBusy(false);
  };
  const errorAt = (field: string) => problems.find((problem) => problem.field === field)?.message;
  return (
    <form noValidate className="account-form" onSubmit={handleSubmit(send)}>
      <h1>Sign in</h1>
      <ErrorSummary problems={problems} attempt={attempt} />
      <TextField
        id="email"
        label="Email"
        type="email"
        inputMode="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        {...(errorAt("email") ? { error: errorAt("email") ?? "" } : {})}
        {...register("email")}
      />
      <PasswordField id="password" label="Password" autoComplete="current-password" error={errorAt("password")} {...register("password")} />
      <BigButton verb="Sign in" busy={busy} className="center" />
      <p className="account-links">
        <Link className="link" href="/sign-up">
          Start a ledger
        </Link>
      </p>
    </form>
  );
}
