"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { SelectField, TextField } from "@/components/ui/field";
import { Panel } from "@/components/ui/panel";
import { ROLES } from "@/db/words";
import type { Role } from "@/lib/auth/permissions";
import { apiSend } from "@/lib/http/fetch";
import { apiKeyInputSchema, type ApiKey } from "@/lib/people/schema";
import { CopyOnce } from "./copy-once";

/** API keys: made, shown once, taken out of use. */
export function ApiKeyPanel({ slug, keys }: { slug: string; keys: ApiKey[] }) {
  const router = useRouter();
  const [made, setMade] = useState<string | null>(null);
  const { register, handleSubmit, reset } = useForm<{ name: string; role: Role }>({ defaultValues: { name: "", role: "bookkeeper" }, shouldFocusError: false });
  const { submit, sending, errors, errorAt } = useApiForm<typeof apiKeyInputSchema, { key: string }>({
    schema: apiKeyInputSchema,
    send: (input) => apiSend(`/api/o/${slug}/api-keys`, { body: input }),
    onDone: ({ key }) => {
      setMade(key);
      reset();
      router.refresh();
    },
  });
  return (
    <Panel title="API keys" sub="for scripts that act for the outfit" padded>
      <ul className="people">
        {keys.map((key) => (
          <li key={key.id}>
            <div>
              <b>{key.name}</b>
              <p className="mut">
                {key.prefix}…, {key.role}, {key.lastUsedAt ? `last used ${key.lastUsedAt.slice(0, 10)}` : "never used"}
              </p>
            </div>
            <Button
              variant="line"
              size="sm"
              onClick={() => void apiSend(`/api/o/${slug}/api-keys/${key.id}`, { method: "DELETE" }).then(() => router.refresh())}
            >
              Take {key.name} out of use
            </Button>
          </li>
        ))}
      </ul>
      <form noValidate className="grid gap-3 pt-3" onSubmit={handleSubmit(submit)}>
        <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: `key-${one.path}`, message: one.message }))} />
        <TextField
          id="key-name"
          label="What it is for"
          autoComplete="off"
          {...(errorAt("name") ? { error: errorAt("name") ?? "" } : {})}
          {...register("name")}
        />
        <SelectField id="key-role" label="Role" {...register("role")}>
          {ROLES.map((role) => (
            <option key={role}>{role}</option>
          ))}
        </SelectField>
        <div>
          <Button type="submit" variant="line" aria-busy={sending}>
            Make a key
          </Button>
        </div>
      </form>
      {made === null ? null : <CopyOnce label="The key" text={made} hint="Copy it now: it is not shown again." />}
    </Panel>
  );
}
