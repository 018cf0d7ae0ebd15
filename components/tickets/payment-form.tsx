"use client";

import { useRouter } from "next/navigation";
import { useForm } from "react-hook-form";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { ChipGroup } from "@/components/ui/chip-group";
import { ErrorSummary } from "@/components/ui/error-summary";
import { TextField } from "@/components/ui/field";
import { NumberInput } from "@/components/ui/number-input";
import { PAYMENT_METHODS } from "@/db/words";
import { decimalFromMinor, minorFromDecimal } from "@/lib/arithmetic/money";
import { readTyped, type Money } from "@/lib/tickets/paper";
import { paymentInputSchema } from "@/lib/tickets/schema";
import { payTicket } from "./send-ticket";
import { METHOD_WORDS } from "./words";

type Values = { paidOn: string; amount: string; method: string };

/** Recording what the yard paid: all that is left unless another amount is typed. */
export function PaymentForm({
  slug,
  ticketId,
  outfit,
  leftMinor,
  today,
  method,
}: {
  slug: string;
  ticketId: string;
  outfit: Money;
  leftMinor: number;
  today: string;
  method: string | null;
}) {
  const router = useRouter();
  const { register, handleSubmit, ...form } = useForm<Values>({
    defaultValues: { paidOn: today, amount: decimalFromMinor(leftMinor, outfit.exponent), method: method ?? "check" },
    shouldFocusError: false,
  });
  const { submit, sending, errors, errorAt } = useApiForm({
    schema: paymentInputSchema,
    send: (input, key) => payTicket(slug, ticketId, input, key),
    onDone: () => {
      form.reset();
      router.refresh();
    },
  });
  const send = (values: Values) => {
    const amount = readTyped(values.amount, outfit);
    const amountMinor = amount !== undefined && /^\d+(\.\d+)?$/.test(amount) ? minorFromDecimal(amount, outfit.exponent) : null;
    return submit({ paidOn: values.paidOn, method: values.method, amountMinor: amountMinor ?? values.amount } as never);
  };
  return (
    <form noValidate className="grid gap-3" onSubmit={handleSubmit(send)}>
      <ErrorSummary problems={errors.map((error) => (error.path === "" ? { message: error.message } : { field: error.path, message: error.message }))} />
      <NumberInput
        id="amountMinor"
        label="Paid"
        unit={outfit.currency}
        currencySymbols={["$", outfit.currency]}
        error={errorAt("amountMinor")}
        {...register("amount")}
      />
      <TextField id="paidOn" label="On" type="date" max={today} error={errorAt("paidOn")} {...register("paidOn")} />
      <ChipGroup
        legend="How"
        name="method"
        size="sm"
        columns={2}
        options={PAYMENT_METHODS.map((one) => ({ value: one, label: METHOD_WORDS[one] }))}
        inputProps={register("method")}
        error={errorAt("method")}
      />
      <Button type="submit" aria-busy={sending}>
        Record payment
      </Button>
    </form>
  );
}
