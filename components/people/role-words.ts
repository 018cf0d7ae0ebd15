import type { Role } from "@/lib/auth/permissions";

const WORDS: Record<Role, { name: string; may: string }> = {
  owner: { name: "owner", may: "everything, members and settings too." },
  bookkeeper: { name: "bookkeeper", may: "tickets, prices, costs and earnings; sees the rest." },
  collector: { name: "collector", may: "logs hauls, weighs in, drafts tickets; no earnings." },
  sorter: { name: "sorter", may: "weighs in, counts, changes bins; no money." },
};

/** A role in plain words, with what it may do. */
export const roleWords = (role: Role): { name: string; may: string } => WORDS[role];
