import { Caution } from "@/components/ui/caution";
import { recordName, stoppingHazards } from "@/lib/catalogue/hazards";

type HeldKind = { name: string; hazards: readonly string[]; holdUntil: string | null };

/** The cautions of kinds that are held: what may not be done to them, and until which record is on file. Nothing where none is held. */
export function HoldCautions({ kinds, level = 2 }: { kinds: HeldKind[]; level?: 2 | 3 }) {
  const held = kinds.filter((kind) => kind.holdUntil !== null);
  const hazards = stoppingHazards(held.flatMap((kind) => kind.hazards)).filter((hazard) => held.some((kind) => kind.holdUntil === hazard.record));
  return hazards.map((hazard) => {
    const names = held.filter((kind) => kind.holdUntil === hazard.record).map((kind) => kind.name);
    const record = hazard.record === null ? null : recordName(hazard.record).toLowerCase();
    return (
      <Caution
        key={hazard.key}
        level={level}
        title={`${hazard.title}: ${[...new Set(names)].join(", ")}`}
        lines={record === null ? hazard.caution : [...hazard.caution, `Held until the ${record} is on file.`]}
      />
    );
  });
}
