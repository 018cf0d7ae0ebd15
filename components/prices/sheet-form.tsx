"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { SelectField, TextField } from "@/components/ui/field";
import { PageHead } from "@/components/ui/page-head";
import { Panel } from "@/components/ui/panel";
import { readNumber } from "@/lib/arithmetic/read-number";
import { formatShortDate } from "@/lib/format";
import { apiSend } from "@/lib/http/fetch";
import { sheetChangeSchema, sheetInputSchema } from "@/lib/prices/schema";
import { SheetRows, type TypedRow } from "./sheet-rows";

export type TypedSheet = { yardId: string; inForceFrom: string; lastDay: string; rows: TypedRow[] };

type Props = {
  slug: string;
  outfit: { weightUnit: "lb" | "kg"; currency: string };
  today: string;
  yards: { id: string; name: string }[];
  start: TypedSheet;
  /** Start of the sheet that the prices were copied from. */
  copiedFrom: string | null;
  kept: { id: string; version: number } | null;
};

/** The rows that carry a price, as the API takes them, and where each stood in the form. */
function filledRows(typed: TypedSheet, currency: string) {
  return typed.rows.flatMap((row, index) => {
    if (row.price.trim() === "") return [];
    const read = readNumber(row.price, { locale: "en-US", currencySymbols: ["$", currency] });
    const line = {
      gradeId: row.gradeId,
      price: read.ok ? read.value : row.price.trim(),
      per: row.per,
      ...(row.wording.trim() === "" ? {} : { yardWording: row.wording }),
    };
    return [{ index, line }];
  });
}

/** Typing a yard's sheet: a row a grade, empty where the yard pays nothing for it. */
export function SheetForm({ slug, outfit, today, yards, start, copiedFrom, kept }: Props) {
  const router = useRouter();
  const { register, handleSubmit, getValues } = useForm<TypedSheet>({ defaultValues: start, shouldFocusError: false });
  const { submit, sending, errors } = useApiForm<typeof sheetInputSchema | typeof sheetChangeSchema, { id: string }>({
    schema: kept ? sheetChangeSchema : sheetInputSchema,
    send: (input, idempotencyKey) =>
      kept
        ? apiSend(`/api/o/${slug}/price-sheets/${kept.id}`, { method: "PATCH", body: input, ifMatch: kept.version })
        : apiSend(`/api/o/${slug}/price-sheets`, { body: input, idempotencyKey }),
    onDone: (sheet) => {
      router.push(`/o/${slug}/prices/sheets/${sheet.id}`);
      router.refresh();
    },
  });
  const send = (typed: TypedSheet) => {
    const dates = { inForceFrom: typed.inForceFrom, ...(typed.lastDay === "" ? {} : { lastDay: typed.lastDay }) };
    const lines = filledRows(typed, outfit.currency).map(({ line }) => line);
    return submit({ ...(kept ? {} : { yardId: typed.yardId }), ...dates, lines } as never);
  };
  // The server counts only the rows that were sent; the form names the row that was typed.
  const places = filledRows(getValues(), outfit.currency).map(({ index }) => index);
  const shown = errors.map((error) => ({
    ...error,
    path: error.path.replace(/^lines\.(\d+)/, (_all, at: string) => `rows.${places[Number.parseInt(at, 10)] ?? at}`),
  }));
  const errorAt = (path: string) => shown.find((error) => error.path === path)?.message;
  return (
    <form noValidate className="grid gap-4" onSubmit={handleSubmit(send)}>
      <PageHead
        title={kept ? "Change price sheet" : "New price sheet"}
        fact={
          copiedFrom ? `Starts from the sheet of ${formatShortDate(copiedFrom, { today })}. Change what changed.` : "Leave empty what the yard does not price."
        }
        actions={
          <Button type="submit" aria-busy={sending}>
            Save sheet
          </Button>
        }
      />
      <ErrorSummary
        problems={shown.map((error) =>
          error.path === "" || error.path === "lines" ? { message: error.message } : { field: error.path, message: error.message },
        )}
      />
      <Panel>
        <div className="tk-head">
          {kept ? null : (
            <SelectField
              id="yardId"
              label="Yard"
              error={errorAt("yardId")}
              {...register("yardId", {
                onChange: (event: { target: { value: string } }) => router.replace(`/o/${slug}/prices/sheets/new?yard=${event.target.value}`),
              })}
            >
              {yards.map((yard) => (
                <option key={yard.id} value={yard.id}>
                  {yard.name}
                </option>
              ))}
            </SelectField>
          )}
          <TextField id="inForceFrom" label="In force from" type="date" error={errorAt("inForceFrom")} {...register("inForceFrom")} />
          <TextField id="lastDay" label="Last day" type="date" optional error={errorAt("lastDay")} {...register("lastDay")} />
        </div>
        <SheetRows rows={start.rows} currency={outfit.currency} register={register} errorAt={errorAt} />
      </Panel>
    </form>
  );
}
