"use client";

import { useCallback, useMemo, useState, useSyncExternalStore } from "react";
import { newId } from "@/lib/ids";
import { freshDraft, holdsWork, readDraft, type HaulDraft } from "@/lib/pickups/draft";
import { keepText, keptText, subscribeToDrafts } from "./haul-draft-store";

const NOTHING = freshDraft("", "");

/** The haul being counted, kept on the device at every change. `restored` when it was begun in an earlier visit. */
export function useHaulDraft(key: string) {
  const [visit] = useState(newId);
  const text = useSyncExternalStore(
    subscribeToDrafts,
    () => keptText(key),
    () => null,
  );
  const kept = useMemo(() => readDraft(text), [text]);

  const change = useCallback(
    (next: (draft: HaulDraft) => Partial<HaulDraft>) => {
      // Read from the store, so that two quick taps before a repaint both count.
      const before = readDraft(keptText(key)) ?? freshDraft(newId(), visit);
      keepText(key, JSON.stringify({ ...before, ...next(before) }));
    },
    [key, visit],
  );
  const clear = useCallback(() => keepText(key, null), [key]);

  return { draft: kept ?? NOTHING, change, clear, restored: kept !== null && kept.visit !== visit && holdsWork(kept) };
}
