/** Drafts kept on the device. Where the browser keeps nothing, they last as long as the page. */

const inMemory = new Map<string, string>();
const listeners = new Set<() => void>();

/** Calls back when a draft changes, here or in another tab. */
export function subscribeToDrafts(listener: () => void): () => void {
  listeners.add(listener);
  window.addEventListener("storage", listener);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("storage", listener);
  };
}

/** The kept text, or null. */
export function keptText(key: string): string | null {
  try {
    return window.localStorage.getItem(key) ?? inMemory.get(key) ?? null;
  } catch {
    return inMemory.get(key) ?? null;
  }
}

/** Keeps a text, or drops it when null. */
export function keepText(key: string, text: string | null): void {
  inMemory.delete(key);
  try {
    if (text === null) window.localStorage.removeItem(key);
    else window.localStorage.setItem(key, text);
  } catch {
    if (text !== null) inMemory.set(key, text);
  }
  for (const listener of listeners) listener();
}
