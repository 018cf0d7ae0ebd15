"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { CheckField, TextAreaField, TextField } from "@/components/ui/field";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { apiSend } from "@/lib/http/fetch";
import { yardChangeSchema, yardInputSchema, type Yard } from "@/lib/prices/schema";

type Values = { name: string; place: string; phone: string; hours: string; note: string; active: boolean };

/** Adding a yard, or changing what is known of one. */
export function YardForm({ slug, kept }: { slug: string; kept: Yard | null }) {
  const router = useRouter();
  const { register, handleSubmit } = useForm<Values>({
    defaultValues: {
      name: kept?.name ?? "",
      place: kept?.place ?? "",
      phone: kept?.phone ?? "",
      hours: kept?.hours ?? "",
      note: kept?.note ?? "",
      active: kept?.active ?? true,
    },
    shouldFocusError: false,
  });
  const { submit, sending, errors, errorAt } = useApiForm<typeof yardInputSchema | typeof yardChangeSchema, unknown>({
    schema: kept ? yardChangeSchema : yardInputSchema,
    send: (input, idempotencyKey) =>
      kept
        ? apiSend(`/api/o/${slug}/yards/${kept.id}`, { method: "PATCH", body: input, ifMatch: kept.version })
        : apiSend(`/api/o/${slug}/yards`, { body: input, idempotencyKey }),
    onDone: () => {
      router.push(`/o/${slug}/prices/yards`);
      router.refresh();
    },
  });
  const send = ({ active, ...words }: Values) => {
    const emptied = Object.fromEntries(Object.entries(words).map(([name, text]) => [name, text.trim() === "" && name !== "name" ? null : text]));
    return submit((kept ? { ...emptied, active } : words) as never);
  };
  return (
    <form noValidate className="grid gap-4" onSubmit={handleSubmit(send)}>
      <PageHead
        title={kept ? kept.name : "Add a yard"}
        actions={
          <Button type="submit" aria-busy={sending}>
            Save yard
          </Button>
        }
      />
      <ErrorSummary problems={errors.map((error) => (error.path === "" ? { message: error.message } : { field: error.path, message: error.message }))} />
      <Panel padded>
        <div className="grid gap-3 pt-3">
          <TextField id="name" label="Name" autoComplete="off" error={errorAt("name")} {...register("name")} />
          <TextField id="place" label="Place" optional autoComplete="off" error={errorAt("place")} {...register("place")} />
          <TextField id="phone" label="Phone" optional autoComplete="off" inputMode="tel" error={errorAt("phone")} {...register("phone")} />
          <TextField
            id="hours"
            label="Hours"
            optional
            autoComplete="off"
            hint="As they say it: Mon to Fri 7:30 to 16:30."
            error={errorAt("hours")}
            {...register("hours")}
          />
          <TextAreaField id="note" label="Note" optional hint="What it asks of sellers, how it pays." error={errorAt("note")} {...register("note")} />
          {kept ? <CheckField id="active" label="In use: counts among the best prices" {...register("active")} /> : null}
        </div>
      </Panel>
    </form>
  );
}
