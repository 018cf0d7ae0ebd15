"use client";

import type { UseFormRegister } from "react-hook-form";
import { hatchClass } from "@/components/ui/families";
import { classes } from "@/components/ui/classes";
import { PRICE_UNITS } from "@/lib/arithmetic/price";
import { formatMoneyPlain, formatWeight } from "@/lib/format";
import type { Money, ReadLine, TypedLine, TypedTicket } from "@/lib/tickets/paper";
import type { BinChoice, GradeChoice } from "./choices";
import { SumVerdict } from "./sum-verdict";

type Props = {
  index: number;
  typed: TypedLine;
  read: ReadLine;
  outfit: Money;
  grades: GradeChoice[];
  bins: BinChoice[];
  sheetPrice: string | null;
  register: UseFormRegister<TypedTicket>;
  errorAt: (path: string) => string | undefined;
  onGrade: (gradeId: string) => void;
  onRemove: (() => void) | null;
};

const CELLS = [
  ["gross", "Gross"],
  ["tare", "Tare"],
  ["deduction", "Deduct"],
  ["net", "Net"],
] as const;

function Cell({ id, label, error, children }: { id: string; label: string; error: string | undefined; children: React.ReactNode }) {
  return (
    <div className="tl-cell">
      <label htmlFor={id}>{label}</label>
      {children}
      {error ? (
        <p id={`${id}-error`} className="err">
          {error}
        </p>
      ) : null}
    </div>
  );
}

/** One line of the paper: what the yard wrote on the left, our check of it on the right. */
export function TicketLineFields(props: Props) {
  const { index, typed, read, outfit, grades, bins, sheetPrice, register, errorAt, onGrade, onRemove } = props;
  const path = (name: keyof TypedLine) => `lines.${index}.${name}` as const;
  const idOf = (name: string) => `lines.${index}.${name}`;
  const wrong = (name: string) => (errorAt(`lines.${index}.${name}`) ? { "aria-invalid": true as const, "aria-describedby": `${idOf(name)}-error` } : {});
  const family = grades.find((grade) => grade.id === typed.gradeId)?.family;
  const ownBins = bins.filter((bin) => bin.gradeId === typed.gradeId);
  const numeric = { type: "text", inputMode: "decimal", autoComplete: "off", spellCheck: false } as const;
  const { onChange: registeredChange, ...gradeField } = register(path("gradeId"));
  return (
    <fieldset className="tl">
      <legend className="vh">Line {index + 1}</legend>
      <span className="tl-no" aria-hidden="true">
        {index + 1}
      </span>
      <div className="tl-what">
        <Cell id={idOf("yardWording")} label="Yard's wording" error={errorAt(`lines.${index}.yardWording`)}>
          <input id={idOf("yardWording")} className="field yard-words" type="text" autoComplete="off" spellCheck={false} {...register(path("yardWording"))} />
        </Cell>
        <Cell id={idOf("gradeId")} label="Our grade" error={errorAt(`lines.${index}.gradeId`)}>
          <span className={classes("grade-pick", family && hatchClass(family))}>
            {family ? <i className="hatch" aria-hidden="true" /> : null}
            <select
              id={idOf("gradeId")}
              className="field"
              {...gradeField}
              {...wrong("gradeId")}
              onChange={(event) => {
                void registeredChange(event);
                onGrade(event.target.value);
              }}
            >
              <option value="">Choose a grade</option>
              {grades.map((grade) => (
                <option key={grade.id} value={grade.id}>
                  {grade.name}
                </option>
              ))}
            </select>
          </span>
        </Cell>
        {ownBins.length > 1 ? (
          <Cell id={idOf("binId")} label="From bin" error={errorAt(`lines.${index}.binId`)}>
            <select id={idOf("binId")} className="field" {...register(path("binId"))}>
              <option value="">Fullest first</option>
              {ownBins.map((bin) => (
                <option key={bin.id} value={bin.id}>
                  {bin.label}, {formatWeight(bin.balance)} {outfit.weightUnit}
                </option>
              ))}
            </select>
          </Cell>
        ) : null}
      </div>
      <div className="tl-figures">
        {CELLS.map(([name, label]) => (
          <Cell key={name} id={idOf(name)} label={`${label}, ${outfit.weightUnit}`} error={errorAt(`lines.${index}.${name}`)}>
            <input
              id={idOf(name)}
              className="field r"
              {...numeric}
              {...register(path(name))}
              {...wrong(name)}
              {...(name === "net" && read.netExpected !== null ? { placeholder: formatWeight(read.netExpected) } : {})}
            />
          </Cell>
        ))}
        {typed.per === "each" ? (
          <Cell id={idOf("pieces")} label="Pieces" error={errorAt(`lines.${index}.pieces`)}>
            <input id={idOf("pieces")} className="field r" {...numeric} inputMode="numeric" {...register(path("pieces"))} {...wrong("pieces")} />
          </Cell>
        ) : null}
        <Cell id={idOf("price")} label={`Price, ${outfit.currency}`} error={errorAt(`lines.${index}.price`)}>
          <input id={idOf("price")} className="field r" {...numeric} {...register(path("price"))} {...wrong("price")} />
        </Cell>
        <Cell id={idOf("per")} label="Per" error={errorAt(`lines.${index}.per`)}>
          <select id={idOf("per")} className="field" {...register(path("per"))}>
            {PRICE_UNITS.map((per) => (
              <option key={per} value={per}>
                {per.replace("-", " ")}
              </option>
            ))}
          </select>
        </Cell>
        <Cell id={idOf("amountMinor")} label={`Amount, ${outfit.currency}`} error={errorAt(`lines.${index}.amountMinor`)}>
          <input
            id={idOf("amountMinor")}
            className="field r amount"
            {...numeric}
            {...register(path("amount"))}
            {...wrong("amountMinor")}
            {...(read.amountExpected !== null ? { placeholder: formatMoneyPlain(read.amountExpected, outfit.currency) } : {})}
          />
        </Cell>
      </div>
      <div className="tl-check" role="status">
        <SumVerdict line={read} sheetPrice={sheetPrice} outfit={outfit} />
        {onRemove ? (
          <button type="button" className="btn line-b sm" onClick={onRemove}>
            Remove line {index + 1}
          </button>
        ) : null}
      </div>
    </fieldset>
  );
}
