import "server-only";
import { hash, verify } from "@node-rs/argon2";

/** NIST SP 800-63B-4: at least 15 characters for a password alone, at least 64 allowed, no composition rules, no truncation. */
const OPTIONS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** The same password typed on two keyboards is one password: Unicode NFKC before hashing. */
const normal = (password: string) => password.normalize("NFKC");

/** argon2id, in PHC string form. */
export const hashPassword = (password: string): Promise<string> => hash(normal(password), OPTIONS);

let decoy: Promise<string> | null = null;

/** Whether the password is right. With no hash (nobody by that e-mail) it takes the same time and answers no. */
export async function passwordMatches(storedHash: string | null, password: string): Promise<boolean> {
  decoy ??= hashPassword("a decoy for mailboxes that have no account");
  const right = await verify(storedHash ?? (await decoy), normal(password));
  return storedHash !== null && right;
}
