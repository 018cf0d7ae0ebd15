import * as z from "zod";
import { ROLES } from "@/db/words";
import { isCurrency } from "@/lib/arithmetic/money";
import { isCommonPassword } from "@/lib/auth/common-passwords";
import { bookUnitField, nameField, optionalNameField } from "@/lib/http/fields";
import { isCountry, isTimeZone } from "./places";

/** NIST SP 800-63B-4: a password alone has at least 15 characters; each code point counts as one. */
export const SHORTEST_PASSWORD = 15;

const emailField = z
  .string("Enter your email.")
  .trim()
  .min(1, { error: "Enter your email.", abort: true })
  .max(254, "Email must be 254 letters or fewer.")
  .refine((text) => z.email().safeParse(text.normalize("NFKC")).success, "Email must be like name@example.com.");

/** A new password: long, and not one that is tried first. No rules about kinds of letters, no cutting off. */
const passwordField = z
  .string("Enter a password.")
  .max(1024, "Password must be 1,024 letters or fewer.")
  .refine((text) => [...text.normalize("NFKC")].length >= SHORTEST_PASSWORD, {
    error: `Password must be ${SHORTEST_PASSWORD} letters or more. Three or four words do well.`,
    abort: true,
  })
  .refine((text) => !isCommonPassword(text), "That password is one of the first that others try. Take three or four words of your own.");

/** The words of a person that their password must not be made of. */
export const ownWords = (input: { name: string; email: string; outfit?: { name: string } | undefined }) => [
  ...input.name.split(/\s+/),
  ...input.email.split(/[@.]/),
  ...(input.outfit ? input.outfit.name.split(/\s+/) : []),
];

/** The problem with a password made of them. */
export const OWN_WORDS = { path: ["password"], error: "That password is made of your own name or outfit. Take three or four other words." };

const outfitFields = {
  name: nameField("Outfit name"),
  country: z.string("Choose a country.").refine(isCountry, "Choose a country from the list."),
  currency: z.string("Choose a currency.").refine(isCurrency, "Currency must be a code like USD."),
  weightUnit: bookUnitField,
  timeZone: z.string("Choose a time zone.").max(64, "Choose a time zone from the list.").refine(isTimeZone, "Time zone must be like America/New_York."),
};

export const signUpSchema = z
  .strictObject({ name: nameField("Your name"), email: emailField, password: passwordField, outfit: z.strictObject(outfitFields, "Say what the outfit is.") })
  .refine((input) => !isCommonPassword(input.password, ownWords(input)), OWN_WORDS);

export const signedUpSchema = z.object({ slug: z.string(), outfitId: z.string(), userId: z.string() });

export const meSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  outfits: z.array(z.object({ slug: z.string(), name: z.string(), role: z.enum(ROLES) })),
});

export const passwordChangeSchema = z.strictObject({
  current: z.string("Enter your password as it is now.").min(1, "Enter your password as it is now.").max(1024, "Password must be 1,024 letters or fewer."),
  next: passwordField,
});

export const doneSchema = z.object({ done: z.literal(true) });

const roleField = z.enum(ROLES, "Role must be owner, bookkeeper, collector or sorter.");

export const memberSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string().nullable(),
  role: z.enum(ROLES),
  joinedAt: z.string(),
  version: z.int(),
});
export const memberListSchema = z.object({ items: z.array(memberSchema), nextCursor: z.null() });
export const memberChangeSchema = z.strictObject({ role: roleField });

export const invitationInputSchema = z.strictObject({ role: roleField, note: optionalNameField("Who it is for") });
export const invitationSchema = z.object({
  id: z.string(),
  role: z.enum(ROLES),
  note: z.string().nullable(),
  createdAt: z.string(),
  expiresAt: z.string(),
});
/** The link is shown once, when the invitation is made. */
export const newInvitationSchema = invitationSchema.extend({ url: z.string() });
export const invitationListSchema = z.object({ items: z.array(invitationSchema), nextCursor: z.null() });

/** Joining by a link: a signed-in person sends nothing, a new one says who they are. */
export const acceptSchema = z.strictObject({
  person: z
    .strictObject({ name: nameField("Your name"), email: emailField, password: passwordField })
    .refine((input) => !isCommonPassword(input.password, ownWords(input)), OWN_WORDS)
    .optional(),
});
export const acceptedSchema = z.object({ slug: z.string() });

export const apiKeyInputSchema = z.strictObject({ name: nameField("Name"), role: roleField });
export const apiKeySchema = z.object({
  id: z.string(),
  name: z.string(),
  role: z.enum(ROLES),
  prefix: z.string(),
  createdAt: z.string(),
  lastUsedAt: z.string().nullable(),
});
/** The key is shown once, when it is made. */
export const newApiKeySchema = apiKeySchema.extend({ key: z.string() });
export const apiKeyListSchema = z.object({ items: z.array(apiKeySchema), nextCursor: z.null() });

export const settingsSchema = z.object({
  slug: z.string(),
  name: z.string(),
  place: z.string().nullable(),
  country: z.string(),
  currency: z.string(),
  weightUnit: z.enum(["lb", "kg"]),
  timeZone: z.string(),
  staleAfterDays: z.int(),
  hidesMoney: z.boolean(),
  /** Currency, weight unit and time zone are fixed once anything was booked. */
  fixed: z.boolean(),
  version: z.int(),
});

export const settingsChangeSchema = z.strictObject({
  name: outfitFields.name.optional(),
  place: optionalNameField("Place", 120).nullable(),
  country: outfitFields.country.optional(),
  currency: outfitFields.currency.optional(),
  weightUnit: bookUnitField.optional(),
  timeZone: outfitFields.timeZone.optional(),
  staleAfterDays: z.int("Days must be a whole number.").min(1, "Days must be 1 or more.").max(365, "Days must be 365 or fewer.").optional(),
  hidesMoney: z.boolean("Hide money must be true or false.").optional(),
});

export type SignUpInput = z.output<typeof signUpSchema>;
export type Me = z.output<typeof meSchema>;
export type Member = z.output<typeof memberSchema>;
export type Invitation = z.output<typeof invitationSchema>;
export type ApiKey = z.output<typeof apiKeySchema>;
export type Settings = z.output<typeof settingsSchema>;
export type SettingsChange = z.output<typeof settingsChangeSchema>;
export type AcceptInput = z.output<typeof acceptSchema>;
