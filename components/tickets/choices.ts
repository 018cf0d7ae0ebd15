/** What the ticket form offers, read by the page. */
export type GradeChoice = { id: string; name: string; family: string };
export type BinChoice = { id: string; label: string; gradeId: string; balance: string };
export type YardChoice = { id: string; name: string };
/** A price in force at a yard; `wording` is how the yard calls the grade. */
export type PriceChoice = { yardId: string; gradeId: string; price: string; per: string; wording: string | null; inForceFrom: string };

export type TicketChoices = { yards: YardChoice[]; grades: GradeChoice[]; bins: BinChoice[]; prices: PriceChoice[] };
