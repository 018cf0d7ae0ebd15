"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ChipGroup } from "@/components/ui/chip-group";
import { TextField } from "@/components/ui/field";
import { readNumber } from "@/lib/arithmetic/read-number";
import type { Bin } from "@/lib/bins/schema";
import { formatWeight } from "@/lib/format";
import { ApiProblem, apiSend } from "@/lib/http/fetch";
import { newId } from "@/lib/ids";

type Props = { slug: string; bins: Bin[]; gradeId: string; chosen: string; unit: string; mayAdd: boolean; onChoose: (bin: Bin | undefined) => void };

/** The bins of the chosen grade with what they hold, and a way to start a new one without leaving the scale. */
export function BinPicker({ slug, bins, gradeId, chosen, unit, mayAdd, onChoose }: Props) {
  const router = useRouter();
  const [adding, setAdding] = useState(false);
  const [label, setLabel] = useState("");
  const [tare, setTare] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const add = async () => {
    const read = tare.trim() === "" ? { ok: true as const, value: "0" } : readNumber(tare, { locale: "en-US", units: [unit] });
    try {
      const bin = await apiSend<Bin>(`/api/o/${slug}/bins`, { body: { label, gradeId, tare: read.ok ? read.value : tare }, idempotencyKey: newId() });
      setAdding(false);
      setLabel("");
      setProblem(null);
      router.refresh();
      onChoose(bin);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.problem.errors?.[0]?.message ?? error.problem.detail);
    }
  };
  return (
    <div className="bin-row">
      {bins.length === 0 ? <p>No bin of this grade yet.</p> : null}
      {bins.length === 0 ? null : (
        <ChipGroup
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
        <div className="notice new-bin">
          <TextField
            id="new-bin-label"
            label="Label"
            autoComplete="off"
            value={label}
            onChange={(event) => setLabel(event.target.value)}
            {...(problem ? { error: problem } : {})}
          />
          <TextField
            id="new-bin-tare"
            label="Tare"
            unit={unit}
            optional
            inputMode="decimal"
            autoComplete="off"
            value={tare}
            onChange={(event) => setTare(event.target.value)}
          />
          <div className="flex flex-wrap gap-4">
            <Button onClick={() => void add()}>Add bin</Button>
            <Button variant="line" onClick={() => setAdding(false)}>
              Leave it
            </Button>
          </div>
        </div>
      ) : null}
    </div>
  );
}
