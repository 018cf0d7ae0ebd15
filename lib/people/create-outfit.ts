import "server-only";
import { accounts, bookState, memberships, outfits } from "@/db/schema";
import { isDuplicateKey, type Transaction } from "@/db/transaction";
import { ACCOUNTS } from "@/lib/books/accounts";
import { copyStartingCatalogue } from "@/lib/catalogue/starting";
import { newId } from "@/lib/ids";

export type NewOutfit = { name: string; place?: string; country: string; currency: string; weightUnit: "lb" | "kg"; timeZone: string };

/** The word of an outfit's URLs: its name in plain letters. Names without any become "outfit". */
export function slugOf(name: string): string {
  const plain = name
    .normalize("NFKD")
    .replaceAll(/[\u0300-\u036f]/g, "")
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, "-")
    .replaceAll(/^-+|-+$/g, "")
    .slice(0, 40)
    .replace(/-+$/, "");
  return plain === "" ? "outfit" : plain;
}

async function insertWithFreeSlug(tx: Transaction, outfit: NewOutfit, id: string, now: Date): Promise<string> {
  const base = slugOf(outfit.name);
  for (let attempt = 1; ; attempt += 1) {
    // A random tail after the first tries, so that a popular name neither counts up for ever nor tells how many there are.
    const slug = attempt === 1 ? base : `${base}-${attempt <= 3 ? attempt : newId().slice(-6)}`;
    try {
      await tx.insert(outfits).values({ ...outfit, id, slug, createdAt: now });
      return slug;
    } catch (error) {
      if (!isDuplicateKey(error) || attempt === 8) throw error;
    }
  }
}

/** Makes an outfit with its accounts, its books, its catalogue and its first owner. */
export async function createOutfit(
  tx: Transaction,
  outfit: NewOutfit,
  owner: { userId: string },
  now: Date,
): Promise<{ id: string; slug: string; memberId: string }> {
  const id = newId();
  const memberId = newId();
  const slug = await insertWithFreeSlug(tx, outfit, id, now);
  await tx.insert(memberships).values({ outfitId: id, id: memberId, userId: owner.userId, role: "owner", joinedAt: now });
  await tx.insert(bookState).values({ outfitId: id });
  await tx.insert(accounts).values(ACCOUNTS.map((account, index) => ({ ...account, outfitId: id, position: index + 1 })));
  await copyStartingCatalogue(tx, { id, weightUnit: outfit.weightUnit });
  return { id, slug, memberId };
}
