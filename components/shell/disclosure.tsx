"use client";

import { usePathname } from "next/navigation";
import { useEffect, useRef, type ReactNode } from "react";

interface DisclosureProps {
  className: string;
  /** The words that open it. */
  summary: ReactNode;
  children: ReactNode;
}

/** A menu that opens without script; with script it also closes on Escape, on a press elsewhere and on arrival. */
export function Disclosure({ className, summary, children }: DisclosureProps) {
  const box = useRef<HTMLDetailsElement>(null);
  const pathname = usePathname();
  useEffect(() => {
    if (box.current) box.current.open = false;
  }, [pathname]);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.key !== "Escape" || !box.current?.open) return;
      box.current.open = false;
      box.current.querySelector("summary")?.focus();
    };
    const onPress = (event: PointerEvent) => {
      if (box.current?.open && event.target instanceof Node && !box.current.contains(event.target)) box.current.open = false;
    };
    document.addEventListener("keydown", onKey);
    document.addEventListener("pointerdown", onPress);
    return () => {
      document.removeEventListener("keydown", onKey);
      document.removeEventListener("pointerdown", onPress);
    };
  }, []);
  return (
    <details ref={box} className={`drop ${className}`}>
      <summary>{summary}</summary>
      <div className="sheet">{children}</div>
    </details>
  );
}
