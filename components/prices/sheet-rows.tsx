"use client";

import type { KeyboardEvent } from "react";
import type { UseFormRegister } from "react-hook-form";
import { LedgerTable, RowHead, Td, Th } from "@/components/ui/ledger-table";
import { GradeTag } from "@/components/ui/tag";
import { PRICE_UNITS } from "@/lib/arithmetic/price";
import type { TypedSheet } from "./sheet-form";

export type TypedRow = { gradeId: string; name: string; family: string; wording: string; price: string; per: string };

type Props = { rows: TypedRow[]; currency: string; register: UseFormRegister<TypedSheet>; errorAt: (path: string) => string | undefined };

/** Up and down move to the same column of the next row, as in a spreadsheet. */
function moveRow(event: KeyboardEvent<HTMLTableSectionElement>): void {
  const step = event.key === "ArrowDown" ? 1 : event.key === "ArrowUp" ? -1 : 0;
  const match = event.target instanceof HTMLInputElement ? /^rows\.(\d+)\.(\w+)$/.exec(event.target.id) : null;
  if (step === 0 || !match?.[1]) return;
  const next = document.getElementById(`rows.${Number.parseInt(match[1], 10) + step}.${match[2]}`);
  if (!(next instanceof HTMLInputElement)) return;
  event.preventDefault();
  next.focus();
  next.select();
}

/** The grid of a sheet: one row a grade. */
export function SheetRows({ rows, currency, register, errorAt }: Props) {
  return (
    <LedgerTable caption="Prices on the sheet, one row a grade" rows="roomy">
      <thead>
        <tr>
          <Th>Grade</Th>
          <Th>Yard’s wording</Th>
          <Th numeric unit={currency}>
            Price
          </Th>
          <Th>Per</Th>
        </tr>
      </thead>
      <tbody onKeyDown={moveRow}>
        {rows.map((row, index) => {
          const error = errorAt(`rows.${index}.price`) ?? errorAt(`rows.${index}.gradeId`);
          return (
            <tr key={row.gradeId}>
              <RowHead>
                <GradeTag family={row.family} name={row.name} />
              </RowHead>
              <Td>
                <input
                  id={`rows.${index}.wording`}
                  aria-label={`${row.name}, yard’s wording`}
                  className="field compact yard-words"
                  autoComplete="off"
                  spellCheck={false}
                  {...register(`rows.${index}.wording`)}
                />
              </Td>
              <Td numeric>
                <input
                  id={`rows.${index}.price`}
                  aria-label={`${row.name}, price in ${currency}`}
                  className="field compact r w-28 text-right"
                  inputMode="decimal"
                  autoComplete="off"
                  aria-invalid={error ? true : undefined}
                  aria-describedby={error ? `rows.${index}.price-error` : undefined}
                  {...register(`rows.${index}.price`)}
                />
                {error ? (
                  <p id={`rows.${index}.price-error`} className="err">
                    {error}
                  </p>
                ) : null}
              </Td>
              <Td>
                <select aria-label={`${row.name}, price per`} className="field compact" {...register(`rows.${index}.per`)}>
                  {PRICE_UNITS.map((per) => (
                    <option key={per} value={per}>
                      {per.replace("-", " ")}
                    </option>
                  ))}
                </select>
              </Td>
            </tr>
          );
        })}
      </tbody>
    </LedgerTable>
  );
}
