import type { ReactNode } from "react";

/** The save area of a field screen, held above the foot in reach of the thumb. Stands last in a `.phone`. */
export function Dock({ children }: { children: ReactNode }) {
  return (
    <div className="dock">
      <div className="save">{children}</div>
    </div>
  );
}
