"use client";

import { ChipGroup } from "@/components/ui/chip-group";
import { SelectField } from "@/components/ui/field";
import { formatWeight } from "@/lib/format";

export type Source = { from: "outside" } | { from: "pile" } | { from: "pickup"; pickupId: string };
export type LotChoice = { id: string; number: number; place: string | null; remainingWeight: string };

type Props = { lots: LotChoice[]; source: Source; unit: string; error: string | undefined; onChange: (source: Source) => void };

/** Where the metal comes from: one haul, the pile as a whole, or outside. It decides what the metal cost. */
export function SourcePicker({ lots, source, unit, error, onChange }: Props) {
  const first = lots[0];
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
        onChange={(from) => onChange(from === "pickup" && first ? { from, pickupId: first.id } : from === "pile" ? { from } : { from: "outside" })}
      />
      {source.from === "pickup" ? (
        <SelectField
          id="pickupId"
          label="Pickup"
          value={source.pickupId}
          onChange={(event) => onChange({ from: "pickup", pickupId: event.target.value })}
          {...(error ? { error } : {})}
        >
          {lots.map((lot) => (
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
