import type { Config } from "tailwindcss";

/** Every colour utility is a token, so that day, night, print and contrast are decided in one place. */
const config: Config = {
  darkMode: ["selector", '[data-theme="dark"]'],
  theme: {
    extend: {
      colors: {
        base: "var(--base)",
        panel: "var(--panel)",
        sunk: "var(--sunk)",
        ink: { DEFAULT: "var(--ink)", 2: "var(--ink-2)", 3: "var(--ink-3)" },
        hair: { DEFAULT: "var(--hair)", 2: "var(--hair-2)" },
        rule: "var(--rule)",
        inv: { DEFAULT: "var(--inv)", ink: "var(--inv-ink)" },
        bar: { DEFAULT: "var(--bar)", ink: "var(--bar-ink)", "ink-2": "var(--bar-ink-2)" },
        act: { DEFAULT: "var(--act)", ink: "var(--act-ink)", wash: "var(--act-wash)" },
        money: { DEFAULT: "var(--money)", text: "var(--money-text)" },
        amber: { DEFAULT: "var(--amber)", ink: "var(--amber-ink)", wash: "var(--amber-wash)" },
        bad: { DEFAULT: "var(--bad)", wash: "var(--bad-wash)" },
      },
      spacing: {
        s1: "var(--s1)",
        s2: "var(--s2)",
        s3: "var(--s3)",
        s4: "var(--s4)",
        s5: "var(--s5)",
        s6: "var(--s6)",
        gutter: "var(--gutter)",
      },
      fontFamily: { sans: ["var(--font-archivo)", "sans-serif"] },
      screens: { desk: "760px" },
    },
  },
};

export default config;
