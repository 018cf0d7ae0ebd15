"use client";

import { ChipGroup } from "@/components/ui/chip-group";
import { TextField } from "@/components/ui/field";
import { Icon, type IconName } from "@/components/ui/icons";
import { NumberInput } from "@/components/ui/number-input";
import { PAID_FROM } from "@/db/words";
import type { HaulDraft } from "@/lib/pickups/draft";
import { PAID_FROM_NAME } from "./words";

interface HaulDetailsProps {
  draft: HaulDraft;
  today: string;
  currency: string;
  currencySymbols: string[];
  onChange: (change: Partial<HaulDraft>) => void;
  errorAt: (path: string) => string | undefined;
}

interface LineProps {
  id: string;
  icon: IconName;
  label: string;
  value: string;
  most: number;
  error: string | undefined;
  onChange: (value: string) => void;
}

/** A line of words with its drawing before it, as wide as the screen. */
function WordLine({ id, icon, label, value, most, error, onChange }: LineProps) {
  return (
    <div className="form-row">
      <div className="haul-line">
        <Icon name={icon} />
        <label htmlFor={id}>{label}</label>
        <input
          id={id}
          type="text"
          autoComplete="off"
          maxLength={most}
          value={value}
          aria-invalid={error ? true : undefined}
          aria-describedby={error ? `${id}-error` : undefined}
          onChange={(event) => onChange(event.target.value)}
        />
      </div>
      {error ? (
        <p id={`${id}-error`} className="err">
          {error}
        </p>
      ) : null}
    </div>
  );
}

/** Where it was, what to know about it, what was paid, and the day. */
export function HaulDetails({ draft, today, currency, currencySymbols, onChange, errorAt }: HaulDetailsProps) {
  return (
    <div className="haul-details">
      <WordLine id="place" icon="pin" label="Place" most={200} value={draft.place} error={errorAt("place")} onChange={(place) => onChange({ place })} />
      <WordLine id="note" icon="note" label="Note" most={2000} value={draft.note} error={errorAt("note")} onChange={(note) => onChange({ note })} />
      <NumberInput
        id="paidMinor"
        label="Paid for it"
        optional
        unit={currency}
        currencySymbols={currencySymbols}
        value={draft.paid}
        error={errorAt("paidMinor")}
        onChange={(event) => onChange({ paid: event.target.value })}
      />
      {draft.paid.trim() === "" ? null : (
        <ChipGroup
          legend="Paid from"
          name="paidFrom"
          columns={2}
          options={PAID_FROM.map((value) => ({ value, label: PAID_FROM_NAME[value] }))}
          value={draft.paidFrom}
          error={errorAt("paidFrom")}
          onChange={(paidFrom) => onChange({ paidFrom })}
        />
      )}
      <TextField
        id="pickedUpOn"
        label="Picked up on"
        type="date"
        max={today}
        value={draft.pickedUpOn ?? today}
        error={errorAt("pickedUpOn")}
        onChange={(event) => onChange({ pickedUpOn: event.target.value === today ? null : event.target.value })}
      />
    </div>
  );
}
