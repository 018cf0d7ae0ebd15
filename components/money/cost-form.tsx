"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { ChipGroup } from "@/components/ui/chip-group";
import { Dock } from "@/components/ui/dock";
import { ErrorSummary } from "@/components/ui/error-summary";
import { TextAreaField, TextField } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/number-input";
import { PhoneBar } from "@/components/ui/phone-bar";
import { COST_KINDS, PAID_FROM } from "@/db/words";
import { sendCost } from "@/lib/money/client";
import { readAmount } from "@/lib/money/rules";
import { costInputSchema } from "@/lib/money/schema";
import { COST_NAME, PAID_FROM_NAME } from "./words";

type Values = { spentOn: string; kind: string; amount: string; paidFrom: string; note: string };

interface CostFormProps {
  slug: string;
  outfit: { currency: string; exponent: number; sign: string };
  today: string;
}

/** Money spent, in the five things there are to say about it. */
export function CostForm({ slug, outfit, today }: CostFormProps) {
  const router = useRouter();
  const { currency, exponent, sign } = outfit;
  const currencySymbols = [sign, currency];
  const { register, handleSubmit } = useForm<Values>({
    defaultValues: { spentOn: today, kind: "fuel", amount: "", paidFrom: "cash", note: "" },
    shouldFocusError: false,
  });
  const { submit, sending, errors, setErrors, errorAt } = useApiForm({
    schema: costInputSchema,
    send: (input, key) => sendCost(slug, input, key),
    onDone: () => {
      router.push(`/o/${slug}/money/costs`);
      router.refresh();
    },
  });
  const send = ({ amount, ...values }: Values) => {
    const amountMinor = readAmount(amount, { exponent, currencySymbols });
    if (amountMinor === null) {
      const message = amount.trim() === "" ? "Enter the amount." : `Amount must be money, like 12${exponent > 0 ? ".50" : "00"}.`;
      setErrors([{ path: "amountMinor", message }]);
      return undefined;
    }
    return submit({ ...values, amountMinor } as never);
  };
  return (
    <form noValidate className="phone" onSubmit={handleSubmit(send)}>
      <PhoneBar back={{ href: `/o/${slug}/money/costs`, label: "Back to costs" }} title="Add cost" />
      <div className="body grid gap-4">
        <ErrorSummary problems={errors.map((error) => (error.path === "" ? { message: error.message } : { field: error.path, message: error.message }))} />
        <ChipGroup
          legend="What for"
          name="kind"
          columns={3}
          options={COST_KINDS.map((value) => ({ value, label: COST_NAME[value] }))}
          inputProps={register("kind")}
          error={errorAt("kind")}
        />
        <NumberInput id="amountMinor" label="Amount" unit={currency} currencySymbols={currencySymbols} error={errorAt("amountMinor")} {...register("amount")} />
        <ChipGroup
          legend="Paid from"
          name="paidFrom"
          columns={2}
          options={PAID_FROM.map((value) => ({ value, label: PAID_FROM_NAME[value] }))}
          inputProps={register("paidFrom")}
          error={errorAt("paidFrom")}
        />
        <TextField id="spentOn" label="Day" type="date" max={today} error={errorAt("spentOn")} {...register("spentOn")} />
        <TextAreaField id="note" label="Note" optional hint="What it was for, from whom." error={errorAt("note")} {...register("note")} />
      </div>
      <Dock>
        <BigButton verb="Save cost" consequence="into the money book" busy={sending} />
      </Dock>
    </form>
  );
}
