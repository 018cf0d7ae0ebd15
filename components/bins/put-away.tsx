"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { Bin } from "@/lib/bins/schema";
import { ApiProblem, apiSend } from "@/lib/http/fetch";

/** Takes an empty bin out of use, or back into it. */
export function PutAway({ slug, bin }: { slug: string; bin: Bin }) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const away = bin.putAwayAt !== null;
  const send = async () => {
    try {
      await apiSend(`/api/o/${slug}/bins/${bin.id}`, { method: "PATCH", ifMatch: bin.version, body: { putAway: !away } });
      setProblem(null);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.problem.detail);
    }
  };
  return (
    <div>
      <Button variant="line" onClick={() => void send()}>
        {away ? `Use ${bin.label} again` : `Put ${bin.label} away`}
      </Button>
      {problem ? (
        <p className="err" role="alert">
          {problem}
        </p>
      ) : null}
    </div>
  );
}
