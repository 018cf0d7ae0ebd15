"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { TextField } from "@/components/ui/field";
import { StepperTile, StepperTiles } from "@/components/ui/stepper-tile";
import { markedHazards } from "@/lib/catalogue/hazards";
import type { ItemKind } from "@/lib/catalogue/schema";
import { MOST_OF_A_KIND } from "@/lib/pickups/schema";

/** Tiles that fit over the details on a phone. */
const FIRST_TILES = 8;

interface TilesProps {
  /** Most used first. */
  kinds: ItemKind[];
  counts: Record<string, number>;
  onCount: (kindId: string, count: number) => void;
}

function Tiles({ label, kinds, counts, onCount }: TilesProps & { label: string }) {
  return (
    <StepperTiles label={label}>
      {kinds.map((kind) => {
        const count = counts[kind.id] ?? 0;
        return (
          <StepperTile
            key={kind.id}
            kind={kind.key ?? ""}
            group={kind.group}
            name={kind.tileName}
            count={count}
            max={MOST_OF_A_KIND}
            hazard={markedHazards(kind.hazards)[0]?.title}
            stop={kind.holdUntil !== null && count > 0}
            onChange={(next) => onCount(kind.id, next)}
          />
        );
      })}
    </StepperTiles>
  );
}

const matches = (kind: ItemKind, words: string): boolean =>
  `${kind.name} ${kind.plural} ${kind.tileName} ${kind.group}`.toLowerCase().includes(words.trim().toLowerCase());

function MoreKinds({ kinds, counts, onCount }: TilesProps) {
  const [search, setSearch] = useState("");
  const found = kinds.filter((kind) => matches(kind, search));
  const groups = [...new Set(found.map((kind) => kind.group))].toSorted();
  return (
    <>
      <TextField id="find-kind" label="Find an item kind" type="search" autoComplete="off" value={search} onChange={(event) => setSearch(event.target.value)} />
      <p role="status" className={found.length === 0 ? "haul-none" : "vh"}>
        {found.length === 0 ? "No item kind has that in its name. Try a shorter word." : `${found.length} item kinds`}
      </p>
      {groups.map((group) => (
        <section key={group} className="haul-group">
          <h2>{group}</h2>
          <Tiles label={group} kinds={found.filter((kind) => kind.group === group)} counts={counts} onCount={onCount} />
        </section>
      ))}
    </>
  );
}

/** What was found, counted by tapping: the kinds used most, and all others one tap away in groups with a search. */
export function HaulTiles({ kinds, counts, onCount }: TilesProps) {
  const [open, setOpen] = useState(false);
  const first = kinds.slice(0, FIRST_TILES);
  const rest = kinds.slice(FIRST_TILES);
  // What was counted among the others stays in sight when they are closed again.
  const shown = open ? first : [...first, ...rest.filter((kind) => (counts[kind.id] ?? 0) > 0)];
  return (
    <div className="haul-tiles" id="items" tabIndex={-1}>
      <Tiles label="What was found" kinds={shown} counts={counts} onCount={onCount} />
      {rest.length > 0 ? (
        <Button variant="line" aria-expanded={open} onClick={() => setOpen(!open)}>
          {open ? "Fewer kinds" : `More kinds (${rest.length})`}
        </Button>
      ) : null}
      {open ? <MoreKinds kinds={rest} counts={counts} onCount={onCount} /> : null}
    </div>
  );
}
