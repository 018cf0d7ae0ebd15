import "server-only";
import grades from "@/db/seed/catalogue/grades.json";
import kindsFirst from "@/db/seed/catalogue/item-kinds-1.json";
import kindsSecond from "@/db/seed/catalogue/item-kinds-2.json";
import { grades as gradeTable, itemKindParts, itemKinds } from "@/db/schema";
import type { FAMILIES } from "@/db/words";
import type { Transaction } from "@/db/transaction";
import { convertWeight } from "@/lib/arithmetic/weight";
import { newId } from "@/lib/ids";

type Family = (typeof FAMILIES)[number];
type CatalogueKind = (typeof kindsFirst)[number] | (typeof kindsSecond)[number];

const CHUNK = 100;

async function inChunks<T>(rows: T[], write: (chunk: T[]) => Promise<unknown>): Promise<void> {
  for (let start = 0; start < rows.length; start += CHUNK) await write(rows.slice(start, start + CHUNK));
}

/**
 * Gives a new outfit its own copy of the catalogue: grades, item kinds and their breakdown sheets. Weights of the catalogue are in pounds
 * and are converted once to the outfit's book unit.
 */
export async function copyStartingCatalogue(tx: Transaction, outfit: { id: string; weightUnit: "lb" | "kg" }): Promise<void> {
  const inBookUnit = (pounds: string) => convertWeight(pounds, "lb", outfit.weightUnit);
  await inChunks(
    grades.map((grade, index) => ({
      outfitId: outfit.id,
      id: newId(),
      key: grade.key,
      name: grade.name,
      family: grade.family as Family,
      tradeCode: grade.tradeCode,
      what: grade.what,
      notThis: grade.notThis,
      typicalRecovery: grade.typicalRecovery,
      regulated: grade.regulated,
      position: index + 1,
    })),
    (chunk) => tx.insert(gradeTable).values(chunk),
  );
  const kinds = ([...kindsFirst, ...kindsSecond] as CatalogueKind[]).map((kind) => ({ ...kind, id: newId() }));
  await inChunks(
    kinds.map((kind, index) => ({
      outfitId: outfit.id,
      id: kind.id,
      key: kind.key,
      name: kind.name,
      plural: kind.plural,
      tileName: kind.tileName,
      groupName: kind.group,
      typicalWeight: inBookUnit(kind.typicalWeightLb),
      weightMark: kind.weightMark,
      minutes: String(kind.minutes),
      hazards: kind.hazards,
      holdUntil: kind.holdUntil,
      sellWholeGrade: kind.sellWholeGrade,
      position: index + 1,
    })),
    (chunk) => tx.insert(itemKinds).values(chunk),
  );
  await inChunks(
    kinds.flatMap((kind) =>
      kind.parts.map((part, index) => ({
        outfitId: outfit.id,
        itemKindId: kind.id,
        position: index + 1,
        key: part.key,
        name: part.name,
        whereItSits: part.where,
        looksLike: part.looksLike,
        test: part.test,
        grade: part.grade,
        altGrade: part.altGrade,
        leaveAs: part.leaveAs,
        perItem: part.perItem,
        typicalWeight: inBookUnit(part.typicalWeightLb),
        weightMark: part.weightMark,
        oftenMissed: part.oftenMissed,
        minutes: String(part.minutes),
        hazard: part.hazard,
      })),
    ),
    (chunk) => tx.insert(itemKindParts).values(chunk),
  );
}
