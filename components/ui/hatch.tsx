import type { CSSProperties } from "react";
import { classes } from "./classes";
import { hatchClass } from "./families";

/** A strip of a family's hatch. Size it with a class or a style; it never scales its pattern. */
export function Hatch({ family, className, style }: { family: string; className?: string; style?: CSSProperties }) {
  return <i aria-hidden="true" className={classes("hatch", hatchClass(family), className)} style={style} />;
}

const all = ["copper", "wire", "brass", "aluminum", "lead-zinc", "electronics", "steel"] as const;

/** All seven hatches in a row, the mark of the account pages. */
export function HatchStrip() {
  return (
    <div className="strip" aria-hidden="true">
      {all.map((family) => (
        <Hatch key={family} family={family} />
      ))}
    </div>
  );
}
