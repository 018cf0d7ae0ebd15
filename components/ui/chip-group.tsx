"use client";

import type { InputHTMLAttributes, ReactNode, Ref } from "react";
import { classes } from "./classes";

export interface ChipOption<Value extends string = string> {
  value: Value;
  label: ReactNode;
  /** A figure at the right of the chip, such as what the bin holds. */
  detail?: ReactNode;
}

interface ChipGroupProps<Value extends string> {
  /** What is being chosen. */
  legend: ReactNode;
  hideLegend?: boolean;
  name: string;
  options: readonly ChipOption<Value>[];
  /** The chosen one, where the parent holds it. */
  value?: Value;
  defaultValue?: Value;
  onChange?: (value: Value) => void;
  /** Attributes for every radio, such as those of react-hook-form's `register`. */
  inputProps?: Omit<InputHTMLAttributes<HTMLInputElement>, "name" | "onChange"> & {
    ref?: Ref<HTMLInputElement>;
    onChange?: InputHTMLAttributes<HTMLInputElement>["onChange"];
  };
  /** Chips in a row; all of them, up to four, unless said. */
  columns?: number;
  size?: "sm" | "md";
  error?: string;
  /** The id of the first radio, which an error summary can link to. */
  id?: string;
  className?: string;
}

/** A short choice as chips: a real radio group, so that it works by keyboard and before the page has loaded. */
export function ChipGroup<Value extends string>(props: ChipGroupProps<Value>) {
  const { legend, hideLegend, name, options, value, defaultValue, onChange, inputProps, columns, size, error } = props;
  const id = props.id ?? name;
  return (
    <fieldset className={classes("form-row", props.className)} aria-describedby={error ? `${id}-error` : undefined}>
      <legend className={hideLegend ? "vh" : undefined}>{legend}</legend>
      <div className={classes("chips", size === "sm" && "sm")} style={{ "--cols": columns ?? Math.min(options.length, 4) }}>
        {options.map((option, index) => (
          <label key={option.value} className={classes("chip", option.detail !== undefined && "split")}>
            <input
              type="radio"
              {...inputProps}
              {...(value !== undefined ? { checked: option.value === value } : null)}
              {...(defaultValue !== undefined ? { defaultChecked: option.value === defaultValue } : null)}
              onChange={(event) => {
                inputProps?.onChange?.(event);
                onChange?.(option.value);
              }}
              id={index === 0 ? id : `${id}-${option.value}`}
              name={name}
              value={option.value}
            />
            <span>{option.label}</span>
            {option.detail !== undefined ? <span className="n detail">{option.detail}</span> : null}
          </label>
        ))}
      </div>
      {error ? (
        <p id={`${id}-error`} className="err">
          {error}
        </p>
      ) : null}
    </fieldset>
  );
}
