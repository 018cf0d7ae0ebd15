import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";

const css = readFileSync(new URL("./tokens.css", import.meta.url), "utf8");
const themes = ["light", "dark"] as const;
type Theme = (typeof themes)[number];

/** The colour a token has in a theme, from the first place that sets it. */
function colorOf(token: string, theme: Theme): string {
  const declared = new RegExp(`--${token}:\\s*(?:light-dark\\(\\s*(#[0-9a-f]{6}),\\s*(#[0-9a-f]{6})\\s*\\)|(#[0-9a-f]{6}))`, "i").exec(css);
  if (!declared) throw new Error(`tokens.css does not set --${token} to a colour`);
  return declared[3] ?? (theme === "light" ? declared[1]! : declared[2]!);
}

/** Relative luminance, as WCAG 2.2 defines it. */
function luminance(color: string): number {
  const [red, green, blue] = [1, 3, 5]
    .map((at) => Number.parseInt(color.slice(at, at + 2), 16) / 255)
    .map((part) => (part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4)) as [number, number, number];
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(ink: string, ground: string, theme: Theme): number {
  const [light, dark] = [luminance(colorOf(ink, theme)), luminance(colorOf(ground, theme))].sort((a, b) => b - a) as [number, number];
  return (light + 0.05) / (dark + 0.05);
}

/** Contrast ratios of WCAG 2.2: 7 for text on field screens, 4.5 for text at the desk, 3 for marks and outlines. */
const pairs: [least: number, ink: string, grounds: string[]][] = [
  [7, "ink", ["base", "panel", "sunk", "act-wash", "amber-wash", "bad-wash"]],
  [7, "ink-2", ["base", "panel", "sunk", "act-wash"]],
  [7, "act-ink", ["act"]],
  [7, "inv-ink", ["inv"]],
  [7, "bar-ink", ["bar"]],
  [7, "bar-ink-2", ["bar"]],
  [7, "ro-ink", ["ro-bg"]],
  [7, "ro-dim", ["ro-bg"]],
  [4.5, "ink-3", ["base", "panel", "sunk"]],
  [4.5, "act", ["base", "panel"]],
  [4.5, "bad", ["base", "panel", "bad-wash"]],
  [4.5, "money-text", ["panel"]],
  [3, "money", ["panel"]],
  ...["copper", "wire", "brass", "alu", "lead", "elec", "iron"].map((family): [number, string, string[]] => [3, `f-${family}`, ["panel"]]),
];

describe.each(themes)("the tokens in %s", (theme) => {
  it.each(pairs)("keep at least %d:1 for --%s", (least, ink, grounds) => {
    for (const ground of grounds) expect(contrast(ink, ground, theme), `--${ink} on --${ground}`).toBeGreaterThanOrEqual(least);
  });
});
