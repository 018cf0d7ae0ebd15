import { add, subtract, sum } from "@/lib/arithmetic/decimal";
import { addMinor, decimalFromMinor, minorFromDecimal } from "@/lib/arithmetic/money";
import { lineAmount, PRICE_UNITS, type PriceUnit } from "@/lib/arithmetic/price";
import { readNumber } from "@/lib/arithmetic/read-number";

/** A line of the paper as it is typed: text in every field. An empty net or amount means "as it adds up". */
export type TypedLine = {
  yardWording: string;
  gradeId: string;
  binId: string;
  gross: string;
  tare: string;
  deduction: string;
  net: string;
  pieces: string;
  price: string;
  per: string;
  amount: string;
};

export type TypedTicket = {
  yardId: string;
  number: string;
  ticketOn: string;
  paymentMethod: string;
  tax: string;
  fee: string;
  /** The total on the paper; empty means "as it adds up". */
  total: string;
  note: string;
  paperSaysSo: boolean;
  lines: TypedLine[];
};

export type Money = { weightUnit: "lb" | "kg"; currency: string; exponent: number };

export const emptyLine = (): TypedLine => ({
  yardWording: "",
  gradeId: "",
  binId: "",
  gross: "",
  tare: "",
  deduction: "",
  net: "",
  pieces: "",
  price: "",
  per: "lb",
  amount: "",
});

const SIGNS = ["$", "€", "£"];

/** A typed number as a decimal string; the text itself when it cannot be read, so that the check can name it; undefined when empty. */
export function readTyped(text: string, outfit: Money): string | undefined {
  if (text.trim() === "") return undefined;
  const read = readNumber(text, { locale: "en-US", units: [outfit.weightUnit], currencySymbols: [...SIGNS, outfit.currency] });
  return read.ok ? read.value : text.trim();
}

const isNumber = (text: string | undefined): text is string => text !== undefined && /^\d+(\.\d+)?$/.test(text);

const readMinor = (text: string, outfit: Money): number | null => {
  const value = readTyped(text, outfit);
  return isNumber(value) ? minorFromDecimal(value, outfit.exponent) : null;
};

/** What a typed line says and what it adds up to. `null` where it cannot be told yet. */
export type ReadLine = {
  gross?: string;
  tare?: string;
  deduction?: string;
  net: string | null;
  netExpected: string | null;
  price: string | null;
  pieces: number | null;
  amountMinor: number | null;
  amountExpected: number | null;
};

const isPer = (text: string): text is PriceUnit => (PRICE_UNITS as readonly string[]).includes(text);

function expectedAmount(line: { net: string | null; price: string | null; per: string; pieces: number | null }, outfit: Money): number | null {
  const { net, price, per, pieces } = line;
  if (net === null || price === null || !isPer(per) || (per === "each" && pieces === null)) return null;
  try {
    return lineAmount({ quantity: net, unit: outfit.weightUnit, price, per, exponent: outfit.exponent, ...(pieces === null ? {} : { pieces }) });
  } catch (error) {
    // A sum past what money can hold is no sum; the form says so when it is sent.
    if (error instanceof RangeError) return null;
    throw error;
  }
}

/** Reads one typed line and does its sums: gross - tare - deduction, and net x price. */
export function readLine(typed: TypedLine, outfit: Money): ReadLine {
  const gross = readTyped(typed.gross, outfit);
  const tare = readTyped(typed.tare, outfit);
  const deduction = readTyped(typed.deduction, outfit);
  const netExpected = isNumber(gross) ? subtract(subtract(gross, isNumber(tare) ? tare : "0"), isNumber(deduction) ? deduction : "0") : null;
  const typedNet = readTyped(typed.net, outfit);
  const net = typedNet === undefined ? netExpected : isNumber(typedNet) ? typedNet : null;
  const typedPrice = readTyped(typed.price, outfit);
  const price = isNumber(typedPrice) ? typedPrice : null;
  const typedPieces = typed.pieces.trim();
  const pieces = /^\d{1,6}$/.test(typedPieces) ? Number.parseInt(typedPieces, 10) : null;
  const amountExpected = expectedAmount({ net, price, per: typed.per, pieces }, outfit);
  const amountMinor = typed.amount.trim() === "" ? amountExpected : readMinor(typed.amount, outfit);
  return {
    ...(gross === undefined ? {} : { gross }),
    ...(tare === undefined ? {} : { tare }),
    ...(deduction === undefined ? {} : { deduction }),
    net,
    netExpected,
    price,
    pieces,
    amountMinor,
    amountExpected,
  };
}

/** Column totals and the total that the lines, tax and fees make. */
export type ReadTicket = {
  lines: ReadLine[];
  gross: string;
  tare: string;
  deduction: string;
  net: string;
  amountMinor: number;
  totalExpected: number;
  totalMinor: number;
};

/** Reads the whole paper. Lines that cannot be told yet count as nothing. */
export function readTicket(typed: TypedTicket, outfit: Money): ReadTicket {
  const lines = typed.lines.map((line) => readLine(line, outfit));
  const column = (of: (line: ReadLine) => string | null | undefined) => sum(lines.map(of).filter((text): text is string => isNumber(text ?? undefined)));
  const amountMinor = addMinor(...lines.map((line) => line.amountMinor ?? 0));
  const totalExpected = addMinor(amountMinor, readMinor(typed.tax, outfit) ?? 0, -(readMinor(typed.fee, outfit) ?? 0));
  const totalMinor = typed.total.trim() === "" ? totalExpected : (readMinor(typed.total, outfit) ?? totalExpected);
  return {
    lines,
    gross: column((line) => line.gross),
    tare: column((line) => line.tare),
    deduction: column((line) => line.deduction),
    net: column((line) => line.net),
    amountMinor,
    totalExpected,
    totalMinor,
  };
}

const optional = <K extends string>(name: K, value: string | undefined): Partial<Record<K, string>> =>
  value === undefined || value.trim() === "" ? {} : ({ [name]: value } as Record<K, string>);

/** Money as minor units for the API; text that is no amount stays text, so that the schema names the field. */
const sentMinor = (text: string, outfit: Money): number | string | undefined => (text.trim() === "" ? undefined : (readMinor(text, outfit) ?? text));

/** The typed paper as the API takes it, not yet checked. */
export function ticketInput(typed: TypedTicket, outfit: Money): Record<string, unknown> {
  const read = readTicket(typed, outfit);
  const tax = sentMinor(typed.tax, outfit);
  const fee = sentMinor(typed.fee, outfit);
  return {
    yardId: typed.yardId,
    number: typed.number,
    ticketOn: typed.ticketOn,
    ...optional("paymentMethod", typed.paymentMethod),
    ...optional("note", typed.note),
    ...(tax === undefined ? {} : { taxMinor: tax }),
    ...(fee === undefined ? {} : { feeMinor: fee }),
    totalMinor: sentMinor(typed.total, outfit) ?? read.totalExpected,
    ...(typed.paperSaysSo ? { paperSaysSo: true } : {}),
    lines: typed.lines.map((line, index) => lineInput(line, read.lines[index], outfit)),
  };
}

function lineInput(typed: TypedLine, read: ReadLine | undefined, outfit: Money): Record<string, unknown> {
  return {
    gradeId: typed.gradeId,
    ...optional("binId", typed.binId),
    ...optional("yardWording", typed.yardWording),
    ...optional("gross", read?.gross),
    ...optional("tare", read?.tare),
    ...optional("deduction", read?.deduction),
    net: readTyped(typed.net, outfit) ?? read?.netExpected ?? "",
    price: readTyped(typed.price, outfit) ?? "",
    per: typed.per,
    ...(read?.pieces == null ? {} : { pieces: read.pieces }),
    amountMinor: sentMinor(typed.amount, outfit) ?? read?.amountExpected ?? 0,
  };
}

/** A kept draft as the form types it. */
export type KeptTicket = {
  yardId: string;
  number: string;
  ticketOn: string;
  paymentMethod: string | null;
  taxMinor: number | null;
  feeMinor: number | null;
  totalMinor: number | null;
  note: string | null;
  paperSaysSo: boolean;
  lines: {
    gradeId: string;
    binId: string | null;
    yardWording: string | null;
    gross: string | null;
    tare: string | null;
    deduction: string | null;
    net: string;
    pieces: number | null;
    price: string | null;
    per: string;
    amountMinor: number | null;
  }[];
};

/** Fills the form from a kept draft. Sums that add up are left to be worked out again. */
export function typedFrom(kept: KeptTicket, outfit: Money): TypedTicket {
  const money = (minor: number | null) => (minor === null || minor === 0 ? "" : decimalFromMinor(minor, outfit.exponent));
  const shown = (text: string | null) => (text === null ? "" : add(text, "0"));
  const typed: TypedTicket = {
    yardId: kept.yardId,
    number: kept.number,
    ticketOn: kept.ticketOn,
    paymentMethod: kept.paymentMethod ?? "",
    tax: money(kept.taxMinor),
    fee: money(kept.feeMinor),
    total: "",
    note: kept.note ?? "",
    paperSaysSo: kept.paperSaysSo,
    lines: kept.lines.map((line) => ({
      yardWording: line.yardWording ?? "",
      gradeId: line.gradeId,
      binId: line.binId ?? "",
      gross: shown(line.gross),
      tare: shown(line.tare),
      deduction: shown(line.deduction),
      net: shown(line.net),
      pieces: line.pieces === null ? "" : String(line.pieces),
      price: shown(line.price),
      per: line.per,
      amount: line.amountMinor === null ? "" : decimalFromMinor(line.amountMinor, outfit.exponent),
    })),
  };
  const totalMinor = readTicket(typed, outfit).totalExpected;
  return kept.totalMinor === null || kept.totalMinor === totalMinor ? typed : { ...typed, total: decimalFromMinor(kept.totalMinor, outfit.exponent) };
}
