import type { PAID_FROM, PICKUP_SOURCES, PICKUP_STATES } from "@/db/words";

/** The closed lists of pickups, as people say them. */
export const SOURCE_NAME: Record<(typeof PICKUP_SOURCES)[number], string> = { curb: "Curb", "call-out": "Call-out", "drop-off": "Drop-off", bought: "Bought" };

export const PAID_FROM_NAME: Record<(typeof PAID_FROM)[number], string> = { cash: "Cash", bank: "Bank", card: "Card", "own-pocket": "Own pocket" };

export const STATE_NAME: Record<(typeof PICKUP_STATES)[number], string> = { open: "Open", "worked-out": "Worked out", void: "Void" };

/** "2 upright vacuums, 1 dishwasher". */
export const kindsInWords = (kinds: { name: string; plural: string; count: number }[]): string =>
  kinds.map((kind) => `${kind.count} ${(kind.count === 1 ? kind.name : kind.plural).replace(/^[A-Z](?=[a-z])/, (letter) => letter.toLowerCase())}`).join(", ");

/** "8 items", "1 item". */
export const itemsInWords = (count: number): string => (count === 1 ? "1 item" : `${count} items`);
