"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { sendCostVoid } from "@/lib/money/client";
import { useAct } from "./use-act";

/** Taking a cost back: a second press confirms it. */
export function VoidCost({ slug, id, about }: { slug: string; id: string; about: string }) {
  const [asking, setAsking] = useState(false);
  const { run, busy, problem } = useAct(
    (key) => sendCostVoid(slug, id, key),
    () => setAsking(false),
  );
  if (!asking)
    return (
      <Button variant="line" size="sm" onClick={() => setAsking(true)}>
        Void<span className="vh"> {about}</span>
      </Button>
    );
  return (
    <span className="flex flex-wrap items-center gap-2">
      {problem === null ? null : (
        <span className="bad" role="alert">
          {problem}
        </span>
      )}
      <Button variant="line" size="sm" onClick={() => setAsking(false)}>
        Keep
      </Button>
      <Button variant="danger" size="sm" aria-busy={busy} onClick={() => void run()}>
        Void it
      </Button>
    </span>
  );
}
