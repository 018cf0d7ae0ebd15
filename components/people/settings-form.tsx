"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { CheckField, TextField } from "@/components/ui/field";
import { LiveRegion } from "@/components/ui/live-region";
import { Panel } from "@/components/ui/panel";
import { apiSend } from "@/lib/http/fetch";
import { settingsChangeSchema, type Settings } from "@/lib/people/schema";

type Values = { name: string; place: string; staleAfterDays: string; hidesMoney: boolean };

/** What the owner may change of the outfit. */
export function SettingsForm({ slug, settings }: { slug: string; settings: Settings }) {
  const router = useRouter();
  const [saved, setSaved] = useState(false);
  const { register, handleSubmit } = useForm<Values>({
    defaultValues: { name: settings.name, place: settings.place ?? "", staleAfterDays: String(settings.staleAfterDays), hidesMoney: settings.hidesMoney },
    shouldFocusError: false,
  });
  const { submit, sending, errors, errorAt } = useApiForm<typeof settingsChangeSchema, unknown>({
    schema: settingsChangeSchema,
    send: (input) => apiSend(`/api/o/${slug}/settings`, { method: "PATCH", body: input, ifMatch: settings.version }),
    onDone: () => {
      setSaved(true);
      router.refresh();
    },
  });
  const send = (values: Values) => {
    const days = /^\d{1,4}$/.test(values.staleAfterDays.trim()) ? Number.parseInt(values.staleAfterDays, 10) : values.staleAfterDays;
    return submit({ name: values.name, place: values.place.trim() === "" ? null : values.place, staleAfterDays: days, hidesMoney: values.hidesMoney } as never);
  };
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  return (
    <form noValidate onSubmit={handleSubmit(send)}>
      <Panel title="Outfit" padded>
        <div className="grid gap-3">
          <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
          <TextField id="name" label="Outfit name" autoComplete="organization" {...error("name")} {...register("name")} />
          <TextField id="place" label="Town" optional autoComplete="off" {...error("place")} {...register("place")} />
          <TextField
            id="staleAfterDays"
            label="A price sheet is stale after"
            unit="days"
            inputMode="numeric"
            autoComplete="off"
            {...error("staleAfterDays")}
            {...register("staleAfterDays")}
          />
          <CheckField id="hidesMoney" label="Hide prices and values from collectors and sorters" {...register("hidesMoney")} />
          <div className="flex flex-wrap items-center gap-3">
            <Button type="submit" aria-busy={sending}>
              Save settings
            </Button>
            <LiveRegion>{saved && errors.length === 0 ? "Saved." : ""}</LiveRegion>
          </div>
        </div>
      </Panel>
    </form>
  );
}
