import next from "eslint-config-next/core-web-vitals";
import typescript from "eslint-config-next/typescript";

const CODE = ["**/*.{ts,tsx,mts,mjs,cjs}"];
const APP = ["app/**/*.{ts,tsx}", "components/**/*.{ts,tsx}", "lib/**/*.{ts,tsx}", "db/**/*.ts"];
const TESTS = ["**/*.test.{ts,tsx}", "tests/**"];

const inexact = "Weights, prices and money are exact decimals: compute and show them with lib/arithmetic.";
const ARITHMETIC = [
  { selector: "CallExpression[callee.name='parseFloat']", message: inexact },
  { selector: "CallExpression[callee.object.name='Number'][callee.property.name='parseFloat']", message: inexact },
  { selector: "CallExpression[callee.name='Number']", message: inexact },
  { selector: "CallExpression[callee.property.name='toFixed']", message: inexact },
];
const ENVIRONMENT = [
  {
    selector: "MemberExpression[object.name='process'][property.name='env']",
    message: "Read the environment through lib/env.ts, where each variable is checked and documented.",
  },
];
const TRANSACTION = [
  {
    selector: "CallExpression[callee.property.name='transaction']",
    message: "Use inTransaction from db/transaction.ts: it sets the isolation level and tries again after a deadlock.",
  },
];
const NUMBER_INPUT = [
  {
    selector: "JSXAttribute[name.name='type'][value.value='number']",
    message: 'A number input rounds, scrolls and drops what it cannot read. Use a text input with inputMode="decimal".',
  },
];
const ZOD = [
  {
    selector: "ImportDeclaration[source.value='zod'] > :matches(ImportSpecifier, ImportDefaultSpecifier)",
    message: 'Write import * as z from "zod": the other form puts all of zod into the page.',
  },
];

const ban = (...rules) => ({ "no-restricted-syntax": ["error", ...rules.flat()] });

const config = [
  { ignores: [".next/**", ".data/**", "drizzle/**", "public/**", "next-env.d.ts", "playwright-report/**", "test-results/**"] },
  ...next,
  ...typescript,
  {
    files: CODE,
    linterOptions: { reportUnusedDisableDirectives: "error" },
    rules: {
      eqeqeq: ["error", "always", { null: "ignore" }],
      "no-var": "error",
      "prefer-const": "error",
      "@typescript-eslint/no-unused-vars": ["error", { args: "after-used", ignoreRestSiblings: true }],
    },
  },
  { files: APP, rules: { "no-console": "error", ...ban(ARITHMETIC, ENVIRONMENT, TRANSACTION, NUMBER_INPUT, ZOD) } },
  // A rule set for some files replaces the one above it, so each exception says in full what still holds there.
  { files: ["lib/arithmetic/**", "lib/format.ts", "components/ui/charts/**"], rules: ban(ENVIRONMENT, TRANSACTION, NUMBER_INPUT, ZOD) },
  { files: ["lib/env.ts"], rules: ban(ARITHMETIC, TRANSACTION, ZOD) },
  { files: ["db/transaction.ts"], rules: ban(ARITHMETIC, ENVIRONMENT, ZOD) },
  { files: TESTS, rules: { "no-restricted-syntax": "off", "no-console": "off" } },
  // Playwright's fixtures call their argument `use`, which is no React hook, and say with {} that they need nothing.
  { files: ["tests/e2e/**"], rules: { "react-hooks/rules-of-hooks": "off", "no-empty-pattern": "off" } },
];

export default config;
