"use client";

import { useState, type ComponentProps } from "react";
import { Field } from "@/components/ui/field";

type Props = { id: string; label: string; hint?: string; error?: string | undefined; autoComplete: "current-password" | "new-password" } & Omit<
  ComponentProps<"input">,
  "id" | "type" | "className"
>;

/** A password with a way to see what is typed. Pasting and password managers are welcome. */
export function PasswordField({ id, label, hint, error, ...input }: Props) {
  const [shown, setShown] = useState(false);
  return (
    <Field id={id} label={label} {...(hint ? { hint } : {})} {...(error ? { error } : {})}>
      {(control) => (
        <span className="with-show">
          <input {...input} {...control} type={shown ? "text" : "password"} spellCheck={false} autoCapitalize="none" />
          <button type="button" className="show" aria-pressed={shown} aria-controls={id} onClick={() => setShown(!shown)}>
            {shown ? "Hide" : "Show"}
          </button>
        </span>
      )}
    </Field>
  );
}
