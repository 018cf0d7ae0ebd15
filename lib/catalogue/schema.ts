import * as z from "zod";
import { FAMILIES } from "@/db/words";
import { compare, isDecimalString, isNegative } from "@/lib/arithmetic/decimal";
import { idField, nameField, noteField, optionalNameField, pageFields, pageOf } from "@/lib/http/fields";

const familyField = z.enum(FAMILIES, `Family must be one of ${FAMILIES.join(", ")}.`);

const recoveryField = z
  .string('Recovery must be a share in quotes, like "0.6".')
  .max(24, "Recovery has too many digits.")
  .refine(isDecimalString, { error: "Recovery must be a share, like 0.6.", abort: true })
  .refine((text) => !isNegative(text) && compare(text, "1") <= 0, "Recovery must be between 0 and 1.")
  .refine((text) => (text.split(".")[1] ?? "").length <= 4, "Recovery must have 4 decimals or fewer.");

/** Lists of the catalogue are short, so a page holds them whole unless asked otherwise. */
const cataloguePage = { ...pageFields, limit: pageFields.limit.unwrap().default(200) };

export const gradeListQuery = z.strictObject({
  ...cataloguePage,
  family: familyField.optional(),
  active: z.enum(["true", "false"], "Active must be true or false.").optional(),
});

/** A grade of the outfit's own. */
export const gradeInputSchema = z.strictObject({
  id: idField().optional(),
  name: nameField("Name"),
  family: familyField,
  what: noteField,
  notThis: noteField,
  tradeCode: optionalNameField("Trade code", 40),
  typicalRecovery: recoveryField.optional(),
  regulated: noteField,
});

/** Words that may be taken away by sending an empty text. */
const clearableWords = (label: string) =>
  z
    .string(`${label} must be words.`)
    .trim()
    .max(2000, `${label} must be 2,000 letters or fewer.`)
    .refine((text) => noteField.safeParse(text).success, `${label} has characters that cannot be kept.`)
    .optional();

/** What may be changed of a grade; at least one field. */
export const gradeChangeSchema = z
  .strictObject({
    name: nameField("Name").optional(),
    what: clearableWords("What"),
    notThis: clearableWords("Not this"),
    active: z.boolean("Active must be true or false.").optional(),
  })
  .refine((change) => Object.values(change).some((value) => value !== undefined), "Say what to change: name, what, notThis or active.");

export const gradeSchema = z.object({
  id: z.string(),
  /** The catalogue's word for it; null for a grade the outfit made itself. */
  key: z.string().nullable(),
  name: z.string(),
  family: z.enum(FAMILIES),
  tradeCode: z.string().nullable(),
  what: z.string(),
  notThis: z.string(),
  typicalRecovery: z.string().nullable(),
  regulated: z.string().nullable(),
  position: z.int(),
  active: z.boolean(),
  version: z.int(),
});
export const gradeListSchema = pageOf(gradeSchema);

export const itemKindListQuery = z.strictObject(cataloguePage);

export const itemKindSchema = z.object({
  id: z.string(),
  key: z.string().nullable(),
  name: z.string(),
  plural: z.string(),
  /** Short enough for a tile on the phone. */
  tileName: z.string(),
  group: z.string(),
  /** One whole item, in the outfit's weight unit. */
  typicalWeight: z.string(),
  weightMark: z.string(),
  minutes: z.string().nullable(),
  hazards: z.array(z.string()),
  /** The record that must exist before it is cut or sold. */
  holdUntil: z.string().nullable(),
  /** Catalogue key of the grade a whole one sells as. */
  sellWholeGrade: z.string().nullable(),
  position: z.int(),
  active: z.boolean(),
  version: z.int(),
});
export const itemKindListSchema = pageOf(itemKindSchema);

const partGradeSchema = z.object({ key: z.string(), id: z.string().nullable(), name: z.string(), family: z.string() });

/** One line of a breakdown sheet. */
export const partSchema = z.object({
  position: z.int(),
  key: z.string(),
  name: z.string(),
  where: z.string(),
  looksLike: z.string(),
  test: z.string().nullable(),
  grade: partGradeSchema,
  altGrade: partGradeSchema.nullable(),
  leaveAs: partGradeSchema.nullable(),
  perItem: z.int(),
  /** All of this part in one item, in the outfit's weight unit. */
  typicalWeight: z.string(),
  weightMark: z.string(),
  oftenMissed: z.boolean(),
  minutes: z.string().nullable(),
  hazard: z.string().nullable(),
});

export const itemKindSheetSchema = itemKindSchema.extend({ parts: z.array(partSchema) });

export type GradeInput = z.output<typeof gradeInputSchema>;
export type GradeChange = z.output<typeof gradeChangeSchema>;
export type Grade = z.output<typeof gradeSchema>;
export type GradeListQuery = z.output<typeof gradeListQuery>;
export type ItemKind = z.output<typeof itemKindSchema>;
export type ItemKindSheet = z.output<typeof itemKindSheetSchema>;
export type SheetPart = z.output<typeof partSchema>;
