import { useId, type InputHTMLAttributes, type ReactNode, type Ref } from "react";
import { classes } from "./classes";

/** One typed figure of the readout: any input attributes (also those of react-hook-form's `register`). */
export type ReadoutInput = Omit<InputHTMLAttributes<HTMLInputElement>, "type"> & {
  ref?: Ref<HTMLInputElement>;
  /** A word at the right of the label, such as the name of the bucket whose tare it is. */
  note?: ReactNode;
  /** Names the label where "gross" or "tare" is not the word. */
  label?: string;
  /** What is wrong with this figure; shown under the readout and tied to the input. */
  error?: string;
};

interface ReadoutProps {
  gross: ReadoutInput;
  tare?: ReadoutInput;
  /** The net as text, `12.40`; `–` while it cannot be told. */
  net: string;
  /** The unit shown after each figure. */
  unit: string;
  netLabel?: string;
  /** Set when a scale says the weight stands still. */
  steady?: boolean;
  /** The three figures in one row, inside a list. */
  mini?: boolean;
  className?: string;
}

function Figure({ input, name, unit }: { input: ReadoutInput; name: string; unit: string }) {
  const fallback = useId();
  const { note, label = name, error, id = fallback, ...rest } = input;
  return (
    <label className="cell" htmlFor={id}>
      <span className="lab">
        <span>
          {label}
          <span className="vh">, in {unit}</span>
        </span>
        {note ? <b>{note}</b> : null}
      </span>
      <span className="dig">
        <input
          type="text"
          inputMode="decimal"
          autoComplete="off"
          spellCheck={false}
          placeholder="0.00"
          {...rest}
          id={id}
          aria-invalid={error ? true : undefined}
          aria-describedby={classes(rest["aria-describedby"], error && `${id}-error`) || undefined}
        />
        <span className="u" aria-hidden="true">
          {unit}
        </span>
      </span>
    </label>
  );
}

/** The bench scale's indicator. Only for weights being entered: never for totals, prices or history. */
export function Readout({ gross, tare, net, unit, netLabel = "net", steady, mini = false, className }: ReadoutProps) {
  const baseId = useId();
  const grossInput = { ...gross, id: gross.id ?? `${baseId}-gross` };
  const tareInput = tare ? { ...tare, id: tare.id ?? `${baseId}-tare` } : undefined;
  const wrong = [grossInput, tareInput].filter((input) => input?.error);
  const netFigure = (
    <output className="dig" htmlFor={classes(grossInput.id, tareInput?.id)} aria-live="polite">
      {net}
      <span className="u">{unit}</span>
    </output>
  );
  return (
    <div className={className}>
      <div className={classes("readout", mini && "mini")} style={{ "--chars": Math.max(net.length, 4) }}>
        <div className="row">
          <Figure input={grossInput} name="gross" unit={unit} />
          {tareInput ? <Figure input={tareInput} name="tare" unit={unit} /> : null}
          {mini ? (
            <div className="cell">
              <span className="lab">{netLabel}</span>
              {netFigure}
            </div>
          ) : null}
        </div>
        {mini ? null : (
          <div className="net">
            <span className="lab">
              <span>{netLabel}</span>
              {steady ? <span className="steady">steady</span> : null}
            </span>
            {netFigure}
          </div>
        )}
      </div>
      <div className="form-row">
        {wrong.map((input) => (
          <p key={input?.id} id={`${input?.id}-error`} className="err">
            {input?.error}
          </p>
        ))}
      </div>
    </div>
  );
}
