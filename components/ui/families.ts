/** The catalogue's families of metal, as they stand in a grade's record. */
export type MetalFamily = "copper" | "wire" | "brass" | "aluminum" | "steel" | "stainless" | "lead-zinc" | "motors" | "electronics" | "precious" | "other";

/** The hatch a family wears: seven materials, and dots for what is no metal. */
export type Hatch = "copper" | "wire" | "brass" | "alu" | "lead" | "elec" | "iron" | "waste";

const hatchOf: Record<MetalFamily, Hatch> = {
  copper: "copper",
  motors: "copper",
  wire: "wire",
  brass: "brass",
  aluminum: "alu",
  "lead-zinc": "lead",
  electronics: "elec",
  precious: "elec",
  steel: "iron",
  stainless: "iron",
  other: "waste",
};

/** The fixed order in which hatches stand in every bar, list and chart. */
export const hatchOrder: readonly Hatch[] = ["copper", "wire", "brass", "alu", "lead", "elec", "iron", "waste"];

/** What a hatch is called when families that share it are summed. */
export const hatchName: Record<Hatch, string> = {
  copper: "Copper",
  wire: "Insulated wire",
  brass: "Brass",
  alu: "Aluminum",
  lead: "Lead & zinc",
  elec: "Electronics",
  iron: "Steel & iron",
  waste: "Other",
};

/** The hatch of a family; a family nobody has heard of wears the dots. */
export function hatchFor(family: string): Hatch {
  return family in hatchOf ? hatchOf[family as MetalFamily] : "waste";
}

/** The class that sets hatch and colour in HTML, such as `f-copper`. */
export function hatchClass(family: string): string {
  const hatch = hatchFor(family);
  return hatch === "waste" ? "f-none" : `f-${hatch}`;
}

/** The colour of a hatch as a CSS value, for tints in SVG. */
export function hatchColor(hatch: Hatch): string {
  return hatch === "waste" ? "var(--ink-3)" : `var(--f-${hatch})`;
}
