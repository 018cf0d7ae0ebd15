"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { HoldCautions } from "@/components/catalogue/hold-caution";
import { useApiForm } from "@/components/forms/use-api-form";
import { BigButton, Button } from "@/components/ui/button";
import { ChipGroup } from "@/components/ui/chip-group";
import { Dock } from "@/components/ui/dock";
import { ErrorSummary } from "@/components/ui/error-summary";
import { PhoneBar } from "@/components/ui/phone-bar";
import { PICKUP_SOURCES } from "@/db/words";
import type { ItemKind } from "@/lib/catalogue/schema";
import { formatDate, formatWeightUnit } from "@/lib/format";
import { sendPickup } from "@/lib/pickups/client";
import { haulTotals, readHaul } from "@/lib/pickups/draft";
import { pickupInputSchema } from "@/lib/pickups/schema";
import { HaulDetails } from "./haul-details";
import { HaulTiles } from "./haul-tiles";
import { useHaulDraft } from "./use-haul-draft";
import { itemsInWords, SOURCE_NAME } from "./words";

interface HaulFormProps {
  slug: string;
  /** Names the draft: one for each member of each outfit on this device. */
  memberId: string;
  outfit: { weightUnit: "lb" | "kg"; currency: string; exponent: number };
  today: string;
  /** The day and time when the page was opened: "Sat Nov 29, 7:42". */
  clock: string;
  /** Most used first. */
  kinds: ItemKind[];
}

const SOURCES = PICKUP_SOURCES.map((value) => ({ value, label: SOURCE_NAME[value] }));

/** The signs that may be typed with an amount: "$" and "USD". */
function symbolsOf(currency: string): string[] {
  const parts = new Intl.NumberFormat("en-US", { style: "currency", currency, currencyDisplay: "narrowSymbol" }).formatToParts(0);
  return [...parts.filter((part) => part.type === "currency").map((part) => part.value), currency];
}

/** Logging a curbside haul: tap what was found, save. Every tap is kept on the device until the ledger has it. */
export function HaulForm({ slug, memberId, outfit, today, clock, kinds }: HaulFormProps) {
  const router = useRouter();
  const { draft, change, clear, restored } = useHaulDraft(`curbweight:haul:${slug}:${memberId}`);
  const [savedNumber, setSavedNumber] = useState<number | null>(null);
  const { submit, sending, errors, setErrors, errorAt } = useApiForm({
    schema: pickupInputSchema,
    send: (input, key) => sendPickup(slug, input, key),
    onDone: (pickup) => {
      setSavedNumber(pickup.number);
      clear();
      router.push(`/o/${slug}/pickups/${pickup.id}?saved=now`);
      router.refresh();
    },
  });
  const currencySymbols = symbolsOf(outfit.currency);
  const totals = haulTotals(draft.counts, kinds);
  const about = `${itemsInWords(totals.items)}, about ${formatWeightUnit(totals.weight, outfit.weightUnit, { places: 0 })}`;
  const save = () => {
    const reading = readHaul(draft, kinds, today, { exponent: outfit.exponent, currencySymbols });
    if (reading.ok) void submit(reading.input);
    else setErrors(reading.errors);
  };
  return (
    <form
      noValidate
      className="phone haul"
      onSubmit={(event) => {
        event.preventDefault();
        save();
      }}
    >
      <PhoneBar
        back={{ href: `/o/${slug}/pickups`, label: "Back to pickups" }}
        title="New haul"
        fact={<a href="#pickedUpOn">{draft.pickedUpOn === null || draft.pickedUpOn === "" ? clock : formatDate(draft.pickedUpOn, { today })}</a>}
      />
      {restored ? (
        <div className="sunk haul-kept">
          <p>
            You began this haul earlier. <b>It is kept on this device.</b>
          </p>
          <Button variant="line" onClick={clear}>
            Start anew
          </Button>
        </div>
      ) : null}
      <div className="body">
        <ErrorSummary
          problems={errors.map((error) => (error.path === "" ? { message: error.message } : { field: error.path.split(".")[0], message: error.message }))}
        />
        <ChipGroup
          legend="Where from"
          hideLegend
          name="source"
          options={SOURCES}
          value={draft.source}
          onChange={(source) => change(() => ({ source }))}
          error={errorAt("source")}
        />
        <div className="haul-work">
          <HaulTiles kinds={kinds} counts={draft.counts} onCount={(id, count) => change((before) => ({ counts: { ...before.counts, [id]: count } }))} />
          <div className="haul-side">
            <HoldCautions kinds={kinds.filter((kind) => (draft.counts[kind.id] ?? 0) > 0)} />
            <HaulDetails
              draft={draft}
              today={today}
              currency={outfit.currency}
              currencySymbols={currencySymbols}
              onChange={(part) => change(() => part)}
              errorAt={errorAt}
            />
          </div>
        </div>
      </div>
      <Dock>
        <BigButton
          verb={savedNumber === null ? "Save haul" : "Saved"}
          busy={sending}
          consequence={savedNumber === null ? (totals.items === 0 ? "nothing counted yet" : about) : `pickup ${savedNumber}`}
        />
      </Dock>
    </form>
  );
}
