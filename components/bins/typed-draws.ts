import { compare, fixed, isPositive, subtract, sum, trim } from "@/lib/arithmetic/decimal";
import { readNumber } from "@/lib/arithmetic/read-number";

/** A container on the scale as it is typed. */
export type TypedDraw = { gross: string; tare: string };

const read = (text: string, unit: string): string | null => {
  const number = readNumber(text, { locale: "en-US", units: [unit] });
  return number.ok ? number.value : null;
};

/** Net of all draws that can be read; null while none can. An empty tare is 0. */
export function readDraws(draws: TypedDraw[], unit: string): { net: string | null } {
  const nets = draws.flatMap((draw) => {
    const gross = read(draw.gross, unit);
    const tare = draw.tare.trim() === "" ? "0" : read(draw.tare, unit);
    return gross === null || tare === null ? [] : [subtract(gross, tare)];
  });
  return { net: nets.length === 0 ? null : sum(nets) };
}

/** A bin's tare as it is typed for the person: two decimals as on the scale, more only where the tare has more, because what stands here is booked. */
export function typedTare(tare: string): string {
  const shown = fixed(tare, 2);
  return compare(shown, tare) === 0 ? shown : trim(tare);
}

/** A new draw under the others, unless the last one puts nothing in yet. */
export function addDraw(draws: TypedDraw[], tare: string, unit: string): TypedDraw[] {
  const { net } = readDraws(draws.slice(-1), unit);
  return net !== null && isPositive(net) ? [...draws, { gross: "", tare }] : draws;
}

/** The field a message about the draws belongs to: the readout for the draw that is typed now, the row of the draw before it. */
export function fieldOf(path: string, drawCount: number): string {
  const [, index, field] = /^draws\.(\d+)\.(gross|tare)$/.exec(path) ?? [];
  if (index === undefined || field === undefined) return path;
  return index === String(drawCount - 1) ? field : `draw-${index}`;
}

/** The draws as the API takes them. Text that is no number stays, so that the check names its field; a last draw left empty is left out. */
export function drawsOf(draws: TypedDraw[], unit: string): { gross: string; tare: string } | { draws: TypedDraw[] } {
  const typed = draws.filter((draw, index) => index === 0 || index < draws.length - 1 || draw.gross.trim() !== "");
  const sent = typed.map(({ gross, tare }) => ({
    gross: read(gross, unit) ?? gross.trim(),
    tare: tare.trim() === "" ? "0" : (read(tare, unit) ?? tare.trim()),
  }));
  return sent.length === 1 && sent[0] ? sent[0] : { draws: sent };
}
