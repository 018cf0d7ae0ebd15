"use client";

import { ChipGroup } from "@/components/ui/chip-group";
import { SelectField } from "@/components/ui/field";
import { formatWeight } from "@/lib/format";

export type Source = { from: "outside" } | { from: "pile" } | { from: "pickup"; lot: LotChoice };
export type LotChoice = { id: string; number: number; place: string | null; remainingWeight: string };

type Props = { lots: LotChoice[]; source: Source; unit: string; error: string | undefined; onChange: (source: Source) => void };

/** Where the metal comes from: one haul, the pile as a whole, or outside. It decides what the metal cost. */
export function SourcePicker({ lots, source, unit, error, onChange }: Props) {
  // An estimate can be short: a haul whose estimate is used up stays in the choice while it is the chosen one.
  const chosen = source.from === "pickup" ? (lots.find((lot) => lot.id === source.lot.id) ?? { ...source.lot, remainingWeight: "0" }) : null;
  const choices = chosen && !lots.some((lot) => lot.id === chosen.id) ? [chosen, ...lots] : lots;
  const first = choices[0];
  return (
    <div className="grid gap-2">
      <ChipGroup
        legend="Comes from"
        name="from"
        options={[
          { value: "outside", label: "Outside" },
          ...(first
            ? ([
                { value: "pickup", label: "A pickup" },
                { value: "pile", label: "The pile" },
              ] as const)
            : []),
        ]}
        value={source.from}
        onChange={(from) => onChange(from === "pickup" && first ? { from, lot: first } : from === "pile" ? { from } : { from: "outside" })}
      />
      {chosen ? (
        <SelectField
          id="pickupId"
          label="Pickup"
          value={chosen.id}
          onChange={(event) => {
            const lot = choices.find((one) => one.id === event.target.value);
            if (lot) onChange({ from: "pickup", lot });
          }}
          {...(error ? { error } : {})}
        >
          {choices.map((lot) => (
            <option key={lot.id} value={lot.id}>
              {lot.number}
              {lot.place ? `, ${lot.place}` : ""}, {formatWeight(lot.remainingWeight)} {unit} left
            </option>
          ))}
        </SelectField>
      ) : null}
    </div>
  );
}
