"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";

/** A secret that is shown this once, with a button that copies it. */
export function CopyOnce({ label, text, hint }: { label: string; text: string; hint: string }) {
  const [copied, setCopied] = useState(false);
  return (
    <div className="notice mt-3" role="status">
      <label htmlFor="copy-once">{label}</label>
      <input id="copy-once" className="field w-full" readOnly value={text} onFocus={(event) => event.target.select()} />
      <div className="flex flex-wrap items-center gap-3 pt-2">
        <Button variant="line" onClick={() => void navigator.clipboard.writeText(text).then(() => setCopied(true))}>
          Copy
        </Button>
        <span>{copied ? "Copied." : hint}</span>
      </div>
    </div>
  );
}
