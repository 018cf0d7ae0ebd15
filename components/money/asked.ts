import type * as z from "zod";

export type Search = Record<string, string | string[] | undefined>;

/** What an address asks of a list. One that makes no sense gets the whole list, and `understood` says so. */
export function askedOf<S extends z.ZodType>(schema: S, search: Search): { query: z.output<S>; given: Record<string, string>; understood: boolean } {
  const given = Object.fromEntries(Object.entries(search).flatMap(([name, value]) => (typeof value === "string" && value !== "" ? [[name, value]] : [])));
  const parsed = schema.safeParse(given);
  return parsed.success ? { query: parsed.data, given, understood: true } : { query: schema.parse({}), given: {}, understood: false };
}

/** The given words without some of them. */
export const without = (given: Record<string, string>, ...names: string[]): Record<string, string> =>
  Object.fromEntries(Object.entries(given).filter(([name]) => !names.includes(name)));
