"use client";

import { useEffect, useRef } from "react";

/** One thing that is wrong: the id of the field it is about (or none) and the words beside that field. */
export interface Problem {
  field?: string;
  message: string;
}

interface ErrorSummaryProps {
  problems: Problem[];
  /** Counts the tries, so that the summary takes the focus again on each. */
  attempt?: number;
}

/** "There is a problem": first in the page after a failed send, focused, with a link to each field. Nothing when all is well. */
export function ErrorSummary({ problems, attempt = 0 }: ErrorSummaryProps) {
  const box = useRef<HTMLDivElement>(null);
  const any = problems.length > 0;
  useEffect(() => {
    if (!any) return;
    box.current?.focus();
    const title = document.title;
    if (!title.startsWith("Error: ")) document.title = `Error: ${title}`;
    return () => {
      document.title = document.title.replace(/^Error: /, "");
    };
  }, [any, attempt]);
  if (!any) return null;
  return (
    <div ref={box} className="problem" role="alert" aria-labelledby="problem-title" tabIndex={-1}>
      <h2 id="problem-title">There is a problem</h2>
      <ul>
        {problems.map((problem) => (
          <li key={`${problem.field}:${problem.message}`}>{problem.field ? <a href={`#${problem.field}`}>{problem.message}</a> : problem.message}</li>
        ))}
      </ul>
    </div>
  );
}
