"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { SelectField, TextField } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/number-input";
import { Panel } from "@/components/ui/panel";
import { readNumber } from "@/lib/arithmetic/read-number";
import { binChangeSchema, binInputSchema, type Bin } from "@/lib/bins/schema";
import { apiSend } from "@/lib/http/fetch";

type Values = { label: string; gradeId: string; tare: string; place: string; sellPoint: string };
type Props = { slug: string; unit: string; grades: { id: string; name: string }[]; kept: Bin | null };

/** Adding a bin, or changing what is known of one. */
export function BinForm({ slug, unit, grades, kept }: Props) {
  const router = useRouter();
  const { register, handleSubmit } = useForm<Values>({
    defaultValues: {
      label: kept?.label ?? "",
      gradeId: kept?.gradeId ?? "",
      tare: kept?.tare ?? "",
      place: kept?.place ?? "",
      sellPoint: kept?.sellPoint ?? "",
    },
    shouldFocusError: false,
  });
  const { submit, sending, errors, errorAt } = useApiForm<typeof binInputSchema | typeof binChangeSchema, Bin>({
    schema: kept ? binChangeSchema : binInputSchema,
    send: (input, idempotencyKey) =>
      kept
        ? apiSend(`/api/o/${slug}/bins/${kept.id}`, { method: "PATCH", body: input, ifMatch: kept.version })
        : apiSend(`/api/o/${slug}/bins`, { body: input, idempotencyKey }),
    onDone: (bin) => {
      router.push(`/o/${slug}/bins/${bin.id}`);
      router.refresh();
    },
  });
  const read = (text: string) => {
    const number = readNumber(text, { locale: "en-US", units: [unit] });
    return number.ok ? number.value : text.trim();
  };
  const send = (values: Values) => {
    const tare = values.tare.trim() === "" ? "0" : read(values.tare);
    const empty = kept ? null : undefined;
    const place = values.place.trim() === "" ? empty : values.place;
    const sellPoint = values.sellPoint.trim() === "" ? empty : read(values.sellPoint);
    const words = { label: values.label, tare, ...(place === undefined ? {} : { place }), ...(sellPoint === undefined ? {} : { sellPoint }) };
    return submit((kept ? words : { ...words, gradeId: values.gradeId }) as never);
  };
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  return (
    <form noValidate className="grid gap-4" onSubmit={handleSubmit(send)}>
      <ErrorSummary problems={errors.map((one) => (one.path === "" ? { message: one.message } : { field: one.path, message: one.message }))} />
      <Panel title={kept ? "Change this bin" : "The bin"} padded>
        <div className="grid gap-3">
          <TextField id="label" label="Label" hint="What is chalked on it, like C2-1." autoComplete="off" {...error("label")} {...register("label")} />
          {kept ? null : (
            <SelectField id="gradeId" label="Grade" {...error("gradeId")} {...register("gradeId")}>
              <option value="">Choose a grade</option>
              {grades.map((grade) => (
                <option key={grade.id} value={grade.id}>
                  {grade.name}
                </option>
              ))}
            </SelectField>
          )}
          <NumberInput id="tare" label="Tare" unit={unit} units={[unit]} optional {...error("tare")} {...register("tare")} />
          <TextField id="place" label="Place" optional autoComplete="off" {...error("place")} {...register("place")} />
          <NumberInput
            id="sellPoint"
            label="Sell point"
            hint="The weight at which you want to sell."
            unit={unit}
            units={[unit]}
            optional
            {...error("sellPoint")}
            {...register("sellPoint")}
          />
          <div>
            <Button type="submit" aria-busy={sending}>
              Save bin
            </Button>
          </div>
        </div>
      </Panel>
    </form>
  );
}
