"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton } from "@/components/ui/button";
import { Dock } from "@/components/ui/dock";
import { ErrorSummary } from "@/components/ui/error-summary";
import { SelectField } from "@/components/ui/field";
import { PhoneBar } from "@/components/ui/phone-bar";
import { Readout } from "@/components/ui/readout";
import { isNegative, isZero, subtract } from "@/lib/arithmetic/decimal";
import { countInputSchema, type Bin, type Count } from "@/lib/bins/schema";
import { formatWeight } from "@/lib/format";
import { apiSend } from "@/lib/http/fetch";
import { drawsOf, readDraws } from "./typed-draws";

type Props = { slug: string; unit: "lb" | "kg"; today: string; bins: Bin[]; preset: string };

/** What the count will do, said before it is booked. */
function outcome(bin: Bin | undefined, net: string | null, unit: string): string {
  if (!bin) return "Choose a bin.";
  const book = `The book says ${formatWeight(bin.balance, { places: 2 })} ${unit}.`;
  if (net === null) return book;
  const difference = subtract(net, bin.balance);
  if (isNegative(net)) return `${book} Tare is more than gross.`;
  if (isZero(difference)) return `${book} The scale agrees.`;
  const size = formatWeight(isNegative(difference) ? subtract("0", difference) : difference, { places: 2 });
  return isNegative(difference) ? `${book} ${size} ${unit} is missing and is booked as a loss.` : `${book} ${size} ${unit} more is found and is booked in.`;
}

/** Counting a bin: put it on the scale, see what the book says, correct the book. */
export function CountForm({ slug, unit, today, bins, preset }: Props) {
  const router = useRouter();
  const [binId, setBinId] = useState(preset);
  const bin = bins.find((one) => one.id === binId);
  const [gross, setGross] = useState("");
  const [tare, setTare] = useState(bin?.tare ?? "");
  const { net } = readDraws([{ gross, tare }], unit);
  const { submit, sending, errors, errorAt } = useApiForm<typeof countInputSchema, Count>({
    schema: countInputSchema,
    send: (input, idempotencyKey) => apiSend(`/api/o/${slug}/counts`, { body: input, idempotencyKey }),
    onDone: (count) => {
      router.push(`/o/${slug}/bins/${count.binId}`);
      router.refresh();
    },
  });
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  return (
    <form
      noValidate
      className="phone"
      onSubmit={(event) => {
        event.preventDefault();
        void submit({ binId, countedOn: today, ...drawsOf([{ gross, tare }], unit) } as never);
      }}
    >
      <PhoneBar back={{ href: `/o/${slug}/bins`, label: "Back to bins" }} title="Count" />
      <div className="body weigh">
        <ErrorSummary problems={errors.map(({ path, message }) => (path === "" ? { message } : { field: path, message }))} />
        <SelectField
          id="binId"
          label="Bin"
          value={binId}
          onChange={(event) => {
            setBinId(event.target.value);
            setTare(bins.find((one) => one.id === event.target.value)?.tare ?? "");
          }}
          {...error("binId")}
        >
          {bins.map((one) => (
            <option key={one.id} value={one.id}>
              {one.label}, {one.gradeName}
            </option>
          ))}
        </SelectField>
        <Readout
          unit={unit}
          net={net === null ? "–" : formatWeight(net, { places: 2 })}
          gross={{ id: "gross", value: gross, onChange: (event) => setGross(event.target.value), ...error("gross") }}
          tare={{ id: "tare", value: tare, onChange: (event) => setTare(event.target.value), ...error("tare") }}
        />
        <p className="book-says" role="status">
          {outcome(bin, net, unit)}
        </p>
      </div>
      <Dock>
        <BigButton
          verb="Correct the book"
          busy={sending}
          consequence={bin && net !== null && !isNegative(net) ? `${bin.label} will hold ${formatWeight(net)} ${unit}` : ""}
        />
      </Dock>
    </form>
  );
}
