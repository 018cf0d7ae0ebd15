/** One mailbox, one spelling: NFKC, trimmed, lower case. */
export const normalEmail = (email: string): string => email.normalize("NFKC").trim().toLowerCase();
