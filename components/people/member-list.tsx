"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";
import { Button } from "@/components/ui/button";
import { ErrorSummary } from "@/components/ui/error-summary";
import { ROLES } from "@/db/words";
import { ApiProblem, apiSend } from "@/lib/http/fetch";
import type { Member } from "@/lib/people/schema";
import { roleWords } from "./role-words";

type Props = { slug: string; members: Member[]; ownId: string; mayChange: boolean };

/** Asked before a member is removed, right under their name. */
function RemovalQuestion({ name, onKeep, onRemove }: { name: string; onKeep: () => void; onRemove: () => void }) {
  return (
    <div className="notice" role="group" aria-label={`Remove ${name}`}>
      <h3>Remove {name}?</h3>
      <p>They are signed out everywhere at once and their API keys stop working. What they booked stays in their name.</p>
      <div className="flex flex-wrap gap-4 pt-2">
        <Button variant="line" onClick={onKeep}>
          Keep {name}
        </Button>
        <Button variant="danger" onClick={onRemove}>
          Remove from the outfit
        </Button>
      </div>
    </div>
  );
}

/** Members with their roles. The owner changes a role in place and removes a member after being asked. */
export function MemberList({ slug, members, ownId, mayChange }: Props) {
  const router = useRouter();
  const [problem, setProblem] = useState<string | null>(null);
  const [leaving, setLeaving] = useState<Member | null>(null);
  const run = async (act: () => Promise<unknown>) => {
    setProblem(null);
    try {
      await act();
      setLeaving(null);
      router.refresh();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      setProblem(error.problem.detail);
    }
  };
  return (
    <div className="in">
      <ErrorSummary problems={problem === null ? [] : [{ message: problem }]} />
      <ul className="people">
        {members.map((member) => (
          <li key={member.id}>
            <div>
              <b>{member.name}</b>
              {member.id === ownId ? <span className="mut"> (you)</span> : null}
              <p className="mut">{member.email ?? roleWords(member.role).may}</p>
            </div>
            {mayChange ? (
              <select
                className="field"
                aria-label={`Role of ${member.name}`}
                value={member.role}
                onChange={(event) =>
                  void run(() =>
                    apiSend(`/api/o/${slug}/members/${member.id}`, { method: "PATCH", ifMatch: member.version, body: { role: event.target.value } }),
                  )
                }
              >
                {ROLES.map((role) => (
                  <option key={role}>{role}</option>
                ))}
              </select>
            ) : (
              <span>{member.role}</span>
            )}
            {mayChange && member.id !== ownId ? (
              <Button variant="line" size="sm" onClick={() => setLeaving(member)}>
                Remove {member.name}
              </Button>
            ) : null}
            {leaving?.id === member.id ? (
              <RemovalQuestion
                name={member.name}
                onKeep={() => setLeaving(null)}
                onRemove={() => void run(() => apiSend(`/api/o/${slug}/members/${member.id}`, { method: "DELETE" }))}
              />
            ) : null}
          </li>
        ))}
      </ul>
    </div>
  );
}
