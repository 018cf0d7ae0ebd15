import type { InputHTMLAttributes, ReactNode, Ref, SelectHTMLAttributes, TextareaHTMLAttributes } from "react";
import { classes } from "./classes";

/** What an input needs from its field so that label, hint and error are tied to it. */
export interface FieldControl {
  id: string;
  className: string;
  "aria-describedby"?: string;
  "aria-invalid"?: true;
}

export interface FieldProps {
  /** The id of the input, which the error summary links to. */
  id: string;
  label: ReactNode;
  /** One short sentence above the input. */
  hint?: ReactNode;
  /** What is wrong and what to do, in the same words as in the error summary. */
  error?: string;
  /** Shown after the input and said in its label. */
  unit?: string;
  optional?: boolean;
  className?: string;
}

/** A labelled input with its hint and its error in text. The child gets the attributes to spread on the input. */
export function Field(props: FieldProps & { children: (control: FieldControl) => ReactNode }) {
  const { id, label, hint, error, unit, optional, className, children } = props;
  const control = children({
    id,
    className: "field",
    "aria-describedby": classes(hint ? `${id}-hint` : null, error ? `${id}-error` : null) || undefined,
    "aria-invalid": error ? true : undefined,
  });
  return (
    <div className={classes("form-row", className)}>
      <label htmlFor={id}>
        {label}
        {unit ? <span className="vh">, in {unit}</span> : null}
        {optional ? <span className="opt"> (optional)</span> : null}
      </label>
      {hint ? (
        <p id={`${id}-hint`} className="hint">
          {hint}
        </p>
      ) : null}
      {unit ? (
        <div className="with-unit">
          {control}
          <span className="unit" aria-hidden="true">
            {unit}
          </span>
        </div>
      ) : (
        control
      )}
      {error ? (
        <p id={`${id}-error`} className="err">
          {error}
        </p>
      ) : null}
    </div>
  );
}

type Own<T> = Omit<T, "id" | "className">;

/** A text input in a field. Further attributes, also those of `register`, go to the input. */
export function TextField({
  id,
  label,
  hint,
  error,
  unit,
  optional,
  className,
  ...input
}: FieldProps & Own<InputHTMLAttributes<HTMLInputElement>> & { ref?: Ref<HTMLInputElement> }) {
  return <Field {...{ id, label, hint, error, unit, optional, className }}>{(control) => <input type="text" {...input} {...control} />}</Field>;
}

/** A longer text in a field. */
export function TextAreaField({
  id,
  label,
  hint,
  error,
  unit,
  optional,
  className,
  ...area
}: FieldProps & Own<TextareaHTMLAttributes<HTMLTextAreaElement>> & { ref?: Ref<HTMLTextAreaElement> }) {
  return <Field {...{ id, label, hint, error, unit, optional, className }}>{(control) => <textarea rows={3} {...area} {...control} />}</Field>;
}

/** A list to choose one from, where chips would be too many. Children are the options. */
export function SelectField({
  id,
  label,
  hint,
  error,
  unit,
  optional,
  className,
  ...select
}: FieldProps & Own<SelectHTMLAttributes<HTMLSelectElement>> & { ref?: Ref<HTMLSelectElement> }) {
  return <Field {...{ id, label, hint, error, unit, optional, className }}>{(control) => <select {...select} {...control} />}</Field>;
}

/** One box to tick, with its words beside it. */
export function CheckField({
  id,
  label,
  ...input
}: { id: string; label: ReactNode } & Own<InputHTMLAttributes<HTMLInputElement>> & { ref?: Ref<HTMLInputElement> }) {
  return (
    <label className="check-row" htmlFor={id}>
      <input {...input} id={id} type="checkbox" />
      <span>{label}</span>
    </label>
  );
}
