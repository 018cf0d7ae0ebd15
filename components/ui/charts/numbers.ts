/** A share of the width as an SVG or CSS percentage. Chart geometry only: no weight or amount is computed here. */
export function percent(share: number): string {
  return `${(share * 100).toFixed(3)}%`;
}

/** A pixel position, short enough for markup. */
export function px(value: number): number {
  return Math.round(value * 100) / 100;
}

/** A weight or amount as a number to draw with. What is written beside the mark comes from the exact text. */
export function forDrawing(value: string): number {
  return Number.parseFloat(value);
}
