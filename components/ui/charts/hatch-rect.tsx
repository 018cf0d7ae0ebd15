import { hatchColor, type Hatch } from "../families";

interface HatchRectProps {
  hatch: Hatch;
  x: number | string;
  y: number;
  width: number | string;
  height: number;
}

/** A block of material: tint, hatch, and a 1 px ink outline. The pattern keeps its size whatever the block's. */
export function HatchRect({ hatch, x, y, width, height }: HatchRectProps) {
  const place = { x, y, width, height };
  return (
    <>
      <rect {...place} fill="var(--panel)" />
      <rect {...place} fill={hatchColor(hatch)} fillOpacity=".17" />
      <rect {...place} fill={`url(#h-${hatch})`} stroke="var(--ink)" strokeWidth="1" />
    </>
  );
}
