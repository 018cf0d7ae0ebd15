import { TZDate } from "@date-fns/tz";
import { format } from "date-fns";

/** The present moment. The only place that asks the machine for it. */
export const now = (): Date => new Date();

/** The calendar date, `YYYY-MM-DD`, that a moment falls on in a time zone (IANA name). */
export const dateIn = (timeZone: string, moment: Date): string => format(new TZDate(moment, timeZone), "yyyy-MM-dd");

/** The month, `YYYY-MM`, of a calendar date. */
export const monthOf = (date: string): string => date.slice(0, 7);

/** The month `by` months later (or earlier when negative). */
export function shiftMonth(month: string, by: number): string {
  const [year = 0, index = 1] = month.split("-").map((part) => Number.parseInt(part, 10));
  const moved = year * 12 + (index - 1) + by;
  return `${String(Math.floor(moved / 12)).padStart(4, "0")}-${String((moved % 12) + 1).padStart(2, "0")}`;
}

/** First and last calendar date of a month. */
export function monthBounds(month: string): { first: string; last: string } {
  const next = new Date(`${shiftMonth(month, 1)}-01T00:00:00Z`);
  return { first: `${month}-01`, last: new Date(next.getTime() - 86_400_000).toISOString().slice(0, 10) };
}

/** Whole days from one calendar date to another; negative when `to` is earlier. */
export const daysBetween = (from: string, to: string): number => Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);

/** The calendar date `days` later (or earlier when negative). */
export const addDays = (date: string, days: number): string => new Date(Date.parse(`${date}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);

/** Whether `YYYY-MM-DD` names a day that exists. */
export function isRealDate(text: string): boolean {
  const moment = new Date(`${text}T00:00:00Z`);
  return !Number.isNaN(moment.getTime()) && moment.toISOString().slice(0, 10) === text;
}
