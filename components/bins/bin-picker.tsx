"use client";

import { useState } from "react";
import { ChipGroup } from "@/components/ui/chip-group";
import type { Bin } from "@/lib/bins/schema";
import { formatWeight } from "@/lib/format";
import { NewBin } from "./new-bin";

type Props = { slug: string; bins: Bin[]; gradeId: string; chosen: string; unit: string; mayAdd: boolean; onChoose: (bin: Bin | undefined) => void };

/** The bins of the chosen grade with what they hold, and a way to start a new one without leaving the scale. */
export function BinPicker({ slug, bins, gradeId, chosen, unit, mayAdd, onChoose }: Props) {
  const [adding, setAdding] = useState(false);
  return (
    <div className="bin-row">
      {bins.length === 0 ? <p>No bin of this grade yet.</p> : null}
      {bins.length === 0 ? null : (
        // As wide as its bins need, so that "New bin" stands beside them where there is room.
        <ChipGroup
          className={bins.length > 2 ? "of-grade many" : "of-grade"}
          legend="Bin"
          hideLegend
          name="binId"
          columns={Math.min(bins.length, 3)}
          options={bins.map((bin) => ({ value: bin.id, label: bin.label, detail: `${formatWeight(bin.balance)} ${unit}` }))}
          value={chosen}
          onChange={(id) => onChoose(bins.find((bin) => bin.id === id))}
        />
      )}
      {mayAdd && !adding ? (
        <button type="button" className="chip" onClick={() => setAdding(true)}>
          New bin
        </button>
      ) : null}
      {adding ? (
        <NewBin
          key={gradeId}
          slug={slug}
          gradeId={gradeId}
          unit={unit}
          onAdded={(bin) => {
            setAdding(false);
            onChoose(bin);
          }}
          onLeave={() => setAdding(false)}
        />
      ) : null}
    </div>
  );
}
