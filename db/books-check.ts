import { checkBooks } from "@/lib/books/always-true";
import { closeDatabase, database } from "./client";
import { outfits } from "./schema";

// Prints the always-true list of every outfit and ends with 1 when a rule does not hold.
const db = database();
let broken = 0;
for (const outfit of await db.select({ id: outfits.id, name: outfits.name }).from(outfits)) {
  process.stdout.write(`${outfit.name}\n`);
  for (const { rule, holds, detail } of await checkBooks(db, { outfitId: outfit.id })) {
    if (!holds) broken += 1;
    process.stdout.write(`  ${holds ? "holds " : "BROKEN"}  ${rule}${holds ? "" : `: ${detail}`}\n`);
  }
}
process.stdout.write(broken === 0 ? "Both books are true.\n" : `${broken} rules do not hold.\n`);
await closeDatabase();
process.exitCode = broken === 0 ? 0 : 1;
