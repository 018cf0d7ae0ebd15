import "server-only";
import type { Books } from "@/lib/books/books";
import { AppError, fieldError } from "@/lib/http/errors";
import { getBin } from "./queries";
import type { Bin } from "./schema";

/** The bin that a weigh-in or count names, as the locked books have it. Throws `input` when it is not here, `conflict` when it is put away. */
export async function requireBinInUse(books: Books, binId: string): Promise<Bin> {
  const bin = await getBin(books.tx, { outfitId: books.ctx.outfit.id, id: binId });
  if (!bin) throw fieldError("binId", "There is no such bin here.");
  if (bin.putAwayAt !== null) throw new AppError("conflict", `${bin.label} is put away. Take it into use again first.`);
  return bin;
}
