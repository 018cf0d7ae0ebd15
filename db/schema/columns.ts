import { bigint, customType, date, datetime, decimal } from "drizzle-orm/mysql-core";

/** A UUIDv7 string. ASCII with a binary collation keeps the keys short and compares them byte by byte. */
export const id = (name: string) =>
  customType<{ data: string; driverData: string }>({
    dataType: () => "char(36) character set ascii collate ascii_bin",
  })(name);

/** A short machine word (a slug, a key, a hash): ASCII, compared byte by byte, at most `length` characters. */
export const word = (name: string, length: number) =>
  customType<{ data: string; driverData: string }>({
    dataType: () => `varchar(${length}) character set ascii collate ascii_bin`,
  })(name);

/** A weight in the outfit's book unit, as a decimal string with four places. */
export const weight = (name: string) => decimal(name, { precision: 14, scale: 4 });

/** A price as the yard quotes it: money per unit, six places, a decimal string. */
export const price = (name: string) => decimal(name, { precision: 14, scale: 6 });

/** Money in minor units of the outfit's currency. Amounts stay within JavaScript's safe integers; lib/arithmetic checks it. */
export const minor = (name: string) => bigint(name, { mode: "number" });

/** A moment in UTC with milliseconds. */
export const instant = (name: string) => datetime(name, { mode: "date", fsp: 3 });

/** A calendar date of business in the outfit's time zone, `YYYY-MM-DD`. */
export const businessDate = (name: string) => date(name, { mode: "string" });
