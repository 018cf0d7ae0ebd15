"use client";

import type { UseFormRegister } from "react-hook-form";
import { SelectField, TextField } from "@/components/ui/field";
import type { TypedTicket } from "@/lib/tickets/paper";
import type { YardChoice } from "./choices";

type Props = {
  yards: YardChoice[];
  today: string;
  /** The day of the yard's sheet in force, or why there is none. */
  sheetFrom: string;
  register: UseFormRegister<TypedTicket>;
  errorAt: (path: string) => string | undefined;
};

/** Top of the paper: whose it is, its number, the day. */
export function TicketHeadFields({ yards, today, sheetFrom, register, errorAt }: Props) {
  return (
    <div className="tk-head">
      <SelectField id="yardId" label="Yard" error={errorAt("yardId")} {...register("yardId")}>
        <option value="">Choose a yard</option>
        {yards.map((yard) => (
          <option key={yard.id} value={yard.id}>
            {yard.name}
          </option>
        ))}
      </SelectField>
      <TextField id="number" label="Their ticket" autoComplete="off" spellCheck={false} error={errorAt("number")} {...register("number")} />
      <TextField id="ticketOn" label="Weighed" type="date" max={today} error={errorAt("ticketOn")} {...register("ticketOn")} />
      <div className="tk-fact">
        <small>Price sheet</small>
        <b className="n">{sheetFrom}</b>
      </div>
    </div>
  );
}
