/** ISO 3166-1 alpha-2 codes, from the standard's own list; names come from the reader's language. */
const CODES =
  "AD AE AF AG AI AL AM AO AQ AR AS AT AU AW AX AZ BA BB BD BE BF BG BH BI BJ BL BM BN BO BQ BR BS BT BV BW BY BZ CA CC CD CF CG CH CI CK CL CM CN CO CR CU CV CW CX CY CZ DE DJ DK DM DO DZ EC EE EG EH ER ES ET FI FJ FK FM FO FR GA GB GD GE GF GG GH GI GL GM GN GP GQ GR GS GT GU GW GY HK HM HN HR HT HU ID IE IL IM IN IO IQ IR IS IT JE JM JO JP KE KG KH KI KM KN KP KR KW KY KZ LA LB LC LI LK LR LS LT LU LV LY MA MC MD ME MF MG MH MK ML MM MN MO MP MQ MR MS MT MU MV MW MX MY MZ NA NC NE NF NG NI NL NO NP NR NU NZ OM PA PE PF PG PH PK PL PM PN PR PS PT PW PY QA RE RO RS RU RW SA SB SC SD SE SG SH SI SJ SK SL SM SN SO SR SS ST SV SX SY SZ TC TD TF TG TH TJ TK TL TM TN TO TR TT TV TW TZ UA UG UM US UY UZ VA VC VE VG VI VN VU WF WS YE YT ZA ZM ZW".split(
    " ",
  );

const known = new Set(CODES);

/** Whether a code is a country of ISO 3166-1. */
export const isCountry = (code: string): boolean => known.has(code);

/** Countries by name, for a picker. */
export function countries(): { code: string; name: string }[] {
  const names = new Intl.DisplayNames("en-US", { type: "region" });
  return CODES.map((code) => ({ code, name: names.of(code) ?? code })).toSorted((a, b) => a.name.localeCompare(b.name));
}

/** Whether a name is a time zone that this server can reckon with. */
export function isTimeZone(name: string): boolean {
  if (!/^[A-Za-z][A-Za-z0-9_+/-]{1,63}$/.test(name)) return false;
  try {
    new Intl.DateTimeFormat("en-US", { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

/** What an outfit in a country usually keeps its books in; each can be changed before it is made. */
const USUAL: Record<string, { currency: string; weightUnit: "lb" | "kg"; timeZone: string }> = {
  US: { currency: "USD", weightUnit: "lb", timeZone: "America/New_York" },
  CA: { currency: "CAD", weightUnit: "lb", timeZone: "America/Toronto" },
  GB: { currency: "GBP", weightUnit: "kg", timeZone: "Europe/London" },
  IE: { currency: "EUR", weightUnit: "kg", timeZone: "Europe/Dublin" },
  MX: { currency: "MXN", weightUnit: "kg", timeZone: "America/Mexico_City" },
  AU: { currency: "AUD", weightUnit: "kg", timeZone: "Australia/Sydney" },
  NZ: { currency: "NZD", weightUnit: "kg", timeZone: "Pacific/Auckland" },
};

/** Currency, weight unit and time zone to start from in a country. */
export const usualIn = (country: string): { currency: string; weightUnit: "lb" | "kg"; timeZone: string } | null => USUAL[country] ?? null;
