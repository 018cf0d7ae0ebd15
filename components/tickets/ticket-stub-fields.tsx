"use client";

import type { UseFormRegister } from "react-hook-form";
import { ChipGroup } from "@/components/ui/chip-group";
import { CheckField, TextAreaField, TextField } from "@/components/ui/field";
import { Sum } from "@/components/ui/ledger-table";
import { PAYMENT_METHODS } from "@/db/words";
import { formatMoney, formatMoneyPlain } from "@/lib/format";
import type { Money, ReadTicket, TypedTicket } from "@/lib/tickets/paper";
import { METHOD_WORDS } from "./words";

type Props = {
  read: ReadTicket;
  outfit: Money;
  wrongSums: boolean;
  register: UseFormRegister<TypedTicket>;
  errorAt: (path: string) => string | undefined;
};

/** Foot of the paper: how it pays, tax and fees, and the total. */
export function TicketStubFields({ read, outfit, wrongSums, register, errorAt }: Props) {
  const numeric = { inputMode: "decimal", autoComplete: "off", spellCheck: false } as const;
  const off = read.totalMinor - read.totalExpected;
  return (
    <div className="tk-stub">
      <ChipGroup
        legend="Paid by"
        name="paymentMethod"
        size="sm"
        options={PAYMENT_METHODS.map((method) => ({ value: method, label: METHOD_WORDS[method] }))}
        inputProps={register("paymentMethod")}
        error={errorAt("paymentMethod")}
      />
      <TextField id="taxMinor" label="Tax" unit={outfit.currency} optional error={errorAt("taxMinor")} {...numeric} {...register("tax")} />
      <TextField id="feeMinor" label="Fees kept back" unit={outfit.currency} optional error={errorAt("feeMinor")} {...numeric} {...register("fee")} />
      <div>
        <TextField
          id="totalMinor"
          label="Total on the paper"
          unit={outfit.currency}
          optional
          hint="Left empty, it is what the lines make."
          placeholder={formatMoneyPlain(read.totalExpected, outfit.currency)}
          error={errorAt("totalMinor")}
          {...numeric}
          {...register("total")}
        />
        {off !== 0 ? (
          <p className="err" role="status">
            The lines make {formatMoney(read.totalExpected, outfit.currency)}; the paper is {formatMoney(off, outfit.currency, { sign: true })} off.
          </p>
        ) : null}
      </div>
      <TextAreaField id="note" label="Note" optional error={errorAt("note")} {...register("note")} />
      <div className="due">
        <small>Due to us</small>
        <output aria-label="Due to us">
          <Sum>{formatMoney(read.totalMinor, outfit.currency)}</Sum>
        </output>
        {wrongSums ? <CheckField id="paperSaysSo" label="Keep the wrong sum: the paper says so" {...register("paperSaysSo")} /> : null}
      </div>
    </div>
  );
}
