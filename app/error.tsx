"use client";

import { useEffect, useRef } from "react";
import { Button } from "@/components/ui/button";

/** A page that failed. What was answered before is in the books; what was not, is not. */
export default function ErrorPage({ error, reset }: { error: Error & { digest?: string }; reset: () => void }) {
  const heading = useRef<HTMLHeadingElement>(null);
  useEffect(() => heading.current?.focus(), []);
  return (
    <div className="narrow-page">
      <title>Error: this page stopped · Curbweight</title>
      <h1 ref={heading} tabIndex={-1}>
        This page stopped
      </h1>
      <p>
        Something went wrong on our side while making it. What you saved before is in the books. If you were saving just now, look whether it is there before
        you save again.
      </p>
      {error.digest ? <p className="mut">If you ask for help, give this number: {error.digest}</p> : null}
      <div className="actions">
        <Button onClick={reset}>Try again</Button>
      </div>
    </div>
  );
}
