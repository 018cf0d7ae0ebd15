"use client";

import { useId, useState, type InputHTMLAttributes, type Ref } from "react";
import { readNumber } from "@/lib/arithmetic/read-number";
import { Field, type FieldProps } from "./field";

interface NumberInputProps extends FieldProps, Omit<InputHTMLAttributes<HTMLInputElement>, "id" | "className" | "type" | "inputMode"> {
  ref?: Ref<HTMLInputElement>;
  /** The reader's locale, which settles what a lone comma before three digits means. */
  locale?: string;
  /** Units that may be typed inside, such as `["lb"]`. */
  units?: string[];
  /** Currency signs that may be typed inside. */
  currencySymbols?: string[];
  /** Set for whole numbers, which get the digits-only keypad. */
  whole?: boolean;
  /** Leaves out the line that says what was understood, where the form shows it elsewhere. */
  quiet?: boolean;
}

/** The number as read, with groups of three and every digit kept. */
function grouped(value: string, locale: string): string {
  return new Intl.NumberFormat(locale, { maximumFractionDigits: 20 }).format(value as `${number}`);
}

/** A weight, price or count typed as text, with an echo of what was understood: "= 1,234 lb". */
export function NumberInput(props: NumberInputProps) {
  const { id, label, hint, error, unit, optional, className, onChange, ...rest } = props;
  const { locale = "en-US", units, currencySymbols, whole = false, quiet = false, ...input } = rest;
  const [typed, setTyped] = useState(() => String(input.value ?? input.defaultValue ?? ""));
  const echoId = useId();
  const text = input.value === undefined ? typed : String(input.value);
  const read = quiet || text.trim() === "" ? null : readNumber(text, { locale, units, currencySymbols });
  return (
    <div className={className}>
      <Field {...{ id, label, hint, error, unit, optional }}>
        {(control) => (
          <input
            autoComplete="off"
            spellCheck={false}
            {...input}
            {...control}
            type="text"
            inputMode={whole ? "numeric" : "decimal"}
            aria-describedby={[control["aria-describedby"], quiet ? "" : echoId].filter(Boolean).join(" ") || undefined}
            onChange={(event) => {
              setTyped(event.target.value);
              onChange?.(event);
            }}
          />
        )}
      </Field>
      {quiet ? null : (
        <div className="form-row">
          <p id={echoId} className="echo n" role="status">
            {read?.ok ? `= ${grouped(read.value, locale)}${unit ? ` ${unit}` : ""}` : ""}
          </p>
        </div>
      )}
    </div>
  );
}
