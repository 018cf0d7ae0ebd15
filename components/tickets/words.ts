import type { PAYMENT_METHODS, TICKET_STATES } from "@/db/words";

type State = (typeof TICKET_STATES)[number];
type Method = (typeof PAYMENT_METHODS)[number];

const STATE_WORDS: Record<State, string> = { draft: "Draft", posted: "Unpaid", paid: "Paid", void: "Void" };

/** A ticket's state as people say it. */
export const stateWords = (state: State): string => STATE_WORDS[state];

/** How a yard pays, as people say it. */
export const METHOD_WORDS: Record<Method, string> = { cash: "Cash", check: "Check", transfer: "Transfer", card: "Card" };
