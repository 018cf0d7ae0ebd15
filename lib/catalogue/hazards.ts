import hazards from "@/db/seed/catalogue/hazards.json";
import records from "@/db/seed/catalogue/records.json";

/** A hazard of the catalogue: its name, its sentences (the worst first), and whether work stops for it. */
export type Hazard = {
  key: string;
  title: string;
  caution: string[];
  /** Nothing is cut or sold until `record` is on file. */
  stop: boolean;
  /** Key of the record that must exist. Null when none. */
  record: string | null;
};

const byKey = new Map<string, Hazard>(hazards.map(({ key, title, caution, stop, record }) => [key, { key, title, caution, stop, record }]));

/** Every kind of scrap has some of these. A triangle for them on each tile would hide the ones that can kill. */
const OF_THE_TRADE = new Set(["dust", "sharp-edges", "no-burning", "heavy-lift"]);

/** The hazards of these keys, in their order. A key that nobody has heard of is left out. */
export const hazardsOf = (keys: readonly string[]): Hazard[] => keys.flatMap((key) => byKey.get(key) ?? []);

/** The hazards that earn the triangle: all but those that every kind of scrap has. */
export const markedHazards = (keys: readonly string[]): Hazard[] => hazardsOf(keys).filter((hazard) => !OF_THE_TRADE.has(hazard.key));

/** The hazards of these keys that stop the work, each once. */
export const stoppingHazards = (keys: readonly string[]): Hazard[] => hazardsOf([...new Set(keys)]).filter((hazard) => hazard.stop);

/**
 * What to mind before taking a kind apart: every sentence of the hazards that can kill, then the first of those that all scrap has. What it is
 * held for has a caution of its own and is left out.
 */
export function workCautions(keys: readonly string[], holdUntil: string | null): string[] {
  const others = hazardsOf(keys).filter((hazard) => holdUntil === null || hazard.record !== holdUntil);
  const [ofTheTrade, worst] = [others.filter((hazard) => OF_THE_TRADE.has(hazard.key)), others.filter((hazard) => !OF_THE_TRADE.has(hazard.key))];
  return [...new Set([...worst.flatMap((hazard) => hazard.caution), ...ofTheTrade.flatMap((hazard) => hazard.caution.slice(0, 1))])];
}

/** The name of a record that must be on file, such as "Refrigerant statement". */
export const recordName = (key: string): string => records.find((record) => record.key === key)?.name ?? "Record";
