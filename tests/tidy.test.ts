import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { fileURLToPath } from "node:url";
import ts from "typescript";
import { describe, expect, test } from "vitest";

const root = path.join(path.dirname(fileURLToPath(import.meta.url)), "..");
const NOT_OURS = new Set([".git", ".next", ".data", "node_modules", "test-results", "playwright-report", "coverage"]);
const TEXT = /\.(tsx?|mts|mjs|cjs|css|json|md|sql|html|svg|example)$|^\.(npmrc|gitignore|prettierignore)$/;

function walk(folder: string): string[] {
  return readdirSync(path.join(root, folder), { withFileTypes: true }).flatMap((entry) => {
    if (NOT_OURS.has(entry.name)) return [];
    const place = path.posix.join(folder, entry.name);
    return entry.isDirectory() ? walk(place) : [place];
  });
}

const files = walk("");
const texts = new Map(
  files.filter((file) => TEXT.test(path.basename(file)) && file !== "package-lock.json").map((file) => [file, readFileSync(path.join(root, file), "utf8")]),
);
const text = (file: string): string => texts.get(file) ?? "";
const matching = (pattern: RegExp): string[] => [...texts.keys()].filter((file) => pattern.test(file));

/** Each place where `pattern` stands, as `file:line`. */
function findings(among: string[], pattern: RegExp): string[] {
  return among.flatMap((file) =>
    text(file)
      .split("\n")
      .flatMap((line, index) => (pattern.test(line) ? [`${file}:${index + 1}`] : [])),
  );
}

const code = matching(/\.(tsx?|mts|mjs|cjs)$/);
const server = code.filter((file) => /^(app|components|lib|db)\//.test(file) && !/\.test\.tsx?$/.test(file));
const routes = matching(/^app\/api\/.*\/route\.ts$/);

/** The handlers of a route file that are longer than `limit` lines. */
function longHandlers(file: string, limit: number): string[] {
  const source = ts.createSourceFile(file, text(file), ts.ScriptTarget.Latest, true);
  const found: string[] = [];
  const visit = (node: ts.Node): void => {
    const named = ts.isPropertyAssignment(node) || ts.isMethodDeclaration(node);
    if (named && node.name.getText(source) === "handler") {
      const first = source.getLineAndCharacterOfPosition(node.getStart(source)).line;
      const last = source.getLineAndCharacterOfPosition(node.getEnd()).line;
      if (last - first + 1 > limit) found.push(`${file}:${first + 1} has ${last - first + 1} lines`);
    }
    ts.forEachChild(node, visit);
  };
  visit(source);
  return found;
}

describe("the look over the files sees them", () => {
  test("there are sources, routes and schema files to look at", () => {
    expect(server.length).toBeGreaterThan(20);
    expect(routes.length).toBeGreaterThan(0);
    expect(matching(/^db\/schema\//).length).toBeGreaterThan(3);
  });
});

describe("routes stay declarations", () => {
  test("a route file has fewer than 80 lines", () => {
    expect(routes.filter((file) => text(file).trimEnd().split("\n").length >= 80)).toEqual([]);
  });

  test("a handler has at most 15 lines", () => {
    expect(routes.flatMap((file) => longHandlers(file, 15))).toEqual([]);
  });
});

describe("the books are append-only in code as well", () => {
  test("no statement updates or deletes rows of the books or the audit log", () => {
    const builder = /\.(update|delete)\(\s*(schema\.)?(movements|movementLines|entries|postings|auditLog)\s*\)/;
    const sql = /\b(update|delete\s+from|truncate(\s+table)?)\s+`?(movements|movement_lines|entries|postings|audit_log)`?\b/i;
    expect(findings(server, builder)).toEqual([]);
    expect(findings(server, sql)).toEqual([]);
  });
});

describe("the schema is the manual", () => {
  test("every table has a comment that says what it holds", () => {
    const bare = matching(/^db\/schema\/.*\.ts$/).flatMap((file) =>
      [...text(file).matchAll(/^(.*)\nexport const (\w+) = mysqlTable\(/gm)]
        .filter(([, before]) => !before?.trimEnd().endsWith("*/"))
        .map(([, , table]) => `${file}: ${table}`),
    );
    expect(bare).toEqual([]);
  });
});

describe("settings are documented", () => {
  test("every variable that the app or its commands read stands in .env.example", () => {
    const block = /const fields = \{([\s\S]*?)\n\} as const;/.exec(text("lib/env.ts"))?.[1] ?? "";
    const ofApp = [...block.matchAll(/^ {2}([A-Z][A-Z_]+):/gm)].map(([, name]) => name ?? "");
    const ofCommands = matching(/^db\/server\//).flatMap((file) => [...text(file).matchAll(/process\.env\.([A-Z_0-9]+)/g)].map(([, name]) => name ?? ""));
    // The system's own, and the switch that an error message mentions itself.
    const known = new Set(["PATH", "DEBUG"]);
    const wanted = [...new Set([...ofApp, ...ofCommands])].filter((name) => !known.has(name));
    expect(wanted).toContain("DATABASE_URL");
    expect(wanted).toContain("DATA_DIR");
    expect(wanted.filter((name) => !new RegExp(`^#?${name}=`, "m").test(text(".env.example")))).toEqual([]);
  });
});

describe("files are kept tidy", () => {
  test("file and folder names are kebab-case", () => {
    const plain = /^\.?[a-z0-9]+([-.][a-z0-9]+)*$/;
    const segment = /^(\[(\.\.\.)?[a-z]+([A-Z][a-z]+)*\]|\([a-z]+(-[a-z]+)*\)|README\.md|DEVELOPERS\.md)$/;
    const odd = files.filter((file) => !file.startsWith("drizzle/") && !file.split("/").every((part) => plain.test(part) || segment.test(part)));
    expect(odd).toEqual([]);
  });

  test("nothing is left to be done later", () => {
    expect(findings(code, /\b(TO[D]O|FIXM[E])\b/)).toEqual([]);
  });

  test("no rule of the linter or the compiler is switched off in place", () => {
    expect(findings(code, /eslint-disabl[e]|@ts-(ignor[e]|nochec[k]|expect-erro[r])/)).toEqual([]);
  });

  test("no file points at a place outside the project", () => {
    const outside = /\bshare[d]\/|(^|[\s"'`(])\/(wor[k]|hom[e]|User[s])\//;
    expect(findings([...texts.keys()], outside)).toEqual([]);
  });

  test("the moment comes from lib/clock.ts, so that a test can choose it", () => {
    const asks = findings(
      server.filter((file) => file.startsWith("lib/") && file !== "lib/clock.ts"),
      /\bnew Date\(\)|\bDate\.now\(\)/,
    );
    expect(asks).toEqual([]);
  });
});
