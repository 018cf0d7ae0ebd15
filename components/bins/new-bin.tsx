"use client";

import { useRouter } from "next/navigation";
import { useEffect, useRef, useState } from "react";
import { useApiForm } from "@/components/forms/use-api-form";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { readNumber } from "@/lib/arithmetic/read-number";
import { binInputSchema, type Bin } from "@/lib/bins/schema";
import { apiSend } from "@/lib/http/fetch";

type Props = { slug: string; gradeId: string; unit: string; onAdded: (bin: Bin) => void; onLeave: () => void };

/** A new bin of the chosen grade, added without leaving the scale. It stands inside the weigh-in's form, so Enter adds the bin and sends no weigh-in. */
export function NewBin({ slug, gradeId, unit, onAdded, onLeave }: Props) {
  const router = useRouter();
  const box = useRef<HTMLDivElement>(null);
  const [label, setLabel] = useState("");
  const [tare, setTare] = useState("");
  const { submit, sending, errors, errorAt } = useApiForm<typeof binInputSchema, Bin>({
    schema: binInputSchema,
    send: (input, idempotencyKey) => apiSend(`/api/o/${slug}/bins`, { body: input, idempotencyKey }),
    onDone: (bin) => {
      router.refresh();
      onAdded(bin);
    },
  });
  const wrong = errors[0]?.path;
  useEffect(() => {
    // On opening, and after a failed try, the focus is where something is to be typed.
    box.current?.querySelector<HTMLInputElement>(wrong === "tare" ? "#new-bin-tare" : "#new-bin-label")?.focus();
  }, [wrong]);
  const add = () => {
    const read = tare.trim() === "" ? { ok: true as const, value: "0" } : readNumber(tare, { locale: "en-US", units: [unit] });
    return submit({ label, gradeId, tare: read.ok ? read.value : tare.trim() });
  };
  const error = (path: string) => {
    const message = errorAt(path);
    return message ? { error: message } : {};
  };
  const onEnter = (event: React.KeyboardEvent) => {
    if (event.key !== "Enter") return;
    event.preventDefault();
    void add();
  };
  const other = errors.find(({ path }) => path !== "label" && path !== "tare");
  return (
    <div ref={box} className="notice new-bin">
      <TextField
        id="new-bin-label"
        label="Label"
        autoComplete="off"
        value={label}
        onChange={(event) => setLabel(event.target.value)}
        onKeyDown={onEnter}
        {...error("label")}
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
        onKeyDown={onEnter}
        {...error("tare")}
      />
      {other ? (
        <p className="err" role="alert">
          {other.message}
        </p>
      ) : null}
      <div className="flex flex-wrap gap-4">
        <Button aria-busy={sending} onClick={() => void add()}>
          Add bin
        </Button>
        <Button variant="line" onClick={onLeave}>
          Leave it
        </Button>
      </div>
    </div>
  );
}
