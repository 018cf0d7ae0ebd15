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
import { formatDate } from "@/lib/format";
import { apiSend } from "@/lib/http/fetch";
import { invitationInputSchema, type Invitation } from "@/lib/people/schema";
import { CopyOnce } from "./copy-once";
import { roleWords } from "./role-words";

type Props = { slug: string; invitations: Invitation[]; today: string };

/** Inviting by a link to copy, and the links that still work. */
export function InvitePanel({ slug, invitations, today }: Props) {
  const router = useRouter();
  const [url, setUrl] = useState<string | null>(null);
  const { register, handleSubmit, reset } = useForm<{ role: Role; note: string }>({ defaultValues: { role: "collector", note: "" }, shouldFocusError: false });
  const { submit, sending, errors, errorAt } = useApiForm<typeof invitationInputSchema, { url: string }>({
    schema: invitationInputSchema,
    send: (input) => apiSend(`/api/o/${slug}/invitations`, { body: input }),
    onDone: (made) => {
      setUrl(made.url);
      reset();
      router.refresh();
    },
  });
  return (
    <Panel title="Invite by a link" sub="good for one person and seven days" padded>
      <form noValidate className="grid gap-3" onSubmit={handleSubmit(submit)}>
        <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
        <SelectField id="role" label="As" {...register("role")}>
          {ROLES.map((role) => (
            <option key={role} value={role}>
              {role}: {roleWords(role).may}
            </option>
          ))}
        </SelectField>
        <TextField
          id="note"
          label="Who it is for"
          optional
          autoComplete="off"
          {...(errorAt("note") ? { error: errorAt("note") ?? "" } : {})}
          {...register("note")}
        />
        <div>
          <Button type="submit" aria-busy={sending}>
            Make a link
          </Button>
        </div>
      </form>
      {url === null ? null : <CopyOnce label="Link to send" text={url} hint="Copy it now: it is not shown again." />}
      {invitations.length === 0 ? null : (
        <ul className="people" aria-label="Links that still work">
          {invitations.map((invitation) => (
            <li key={invitation.id}>
              <div>
                <b>{invitation.note ?? `A ${invitation.role}`}</b>
                <p className="mut">
                  {invitation.role}, works until {formatDate(invitation.expiresAt.slice(0, 10), { today })}
                </p>
              </div>
              <Button
                variant="line"
                size="sm"
                onClick={() => void apiSend(`/api/o/${slug}/invitations/${invitation.id}`, { method: "DELETE" }).then(() => router.refresh())}
              >
                Take back link for {invitation.note ?? invitation.role}
              </Button>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}
