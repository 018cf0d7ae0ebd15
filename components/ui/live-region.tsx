import type { ReactNode } from "react";

interface LiveRegionProps {
  /** What has just become so. Keep the region in the page and change its words. */
  children: ReactNode;
  /** Only for screen readers, where the eye sees it elsewhere. */
  hidden?: boolean;
  className?: string;
}

/** Says a change aloud without moving the focus. */
export function LiveRegion({ children, hidden = false, className }: LiveRegionProps) {
  return (
    <div role="status" aria-live="polite" className={hidden ? "vh" : className}>
      {children}
    </div>
  );
}
