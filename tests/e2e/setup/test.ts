import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import { expect, test as base, type Page } from "@playwright/test";
import type { AxeResults } from "axe-core";
import demo from "../../../db/seed/demo-sign-ins.json" with { type: "json" };

export { expect };
export type Role = "owner" | "bookkeeper" | "collector" | "sorter";
type Session = Awaited<ReturnType<ReturnType<Page["context"]>["storageState"]>>;

/** A phone held in one hand, and a desk. */
export const PHONE = { width: 390, height: 844 };
export const DESK = { width: 1280, height: 800 };

const axeSource = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

/** Signs a person in through next-auth's own routes, as the sign-in form does. The page's context has the session afterwards. */
export async function signIn(page: Page, email: string, password: string): Promise<void> {
  const request = page.context().request;
  const { csrfToken } = (await (await request.get("/api/auth/csrf")).json()) as { csrfToken: string };
  const answer = await request.post("/api/auth/callback/credentials", { form: { csrfToken, email, password, json: "true" } });
  expect(answer.ok(), `${email} can sign in`).toBe(true);
  const me = await request.get("/api/me");
  expect(me.status(), `${email} is signed in`).toBe(200);
}

type Fixtures = {
  /** Signs a member of the demo outfit in. Later tests of the same worker use the same session. */
  signInAs: (role: Role) => Promise<void>;
  /** Fails when axe finds anything against WCAG 2.2 A or AA on the page as it is now. */
  expectAccessible: () => Promise<void>;
  /** What the page wrote to the browser's console as an error. Checked after each test; take a message out of it that a test means to cause. */
  complaints: string[];
};

export const test = base.extend<Fixtures, { sessions: Map<Role, Session> }>({
  sessions: [async ({}, use) => use(new Map()), { scope: "worker" }],

  signInAs: async ({ page, sessions }, use) => {
    await use(async (role) => {
      const kept = sessions.get(role);
      if (kept) {
        await page.context().addCookies(kept.cookies);
        return;
      }
      const person = demo.people.find((one) => one.role === role);
      if (!person) throw new Error(`the demo outfit has no ${role}`);
      await signIn(page, person.email, demo.password);
      sessions.set(role, await page.context().storageState());
    });
  },

  expectAccessible: async ({ page }, use) => {
    await use(async () => {
      await page.evaluate(axeSource);
      const violations = await page.evaluate(async () => {
        const { axe } = window as unknown as { axe: { run: (options: object) => Promise<AxeResults> } };
        const found = await axe.run({ runOnly: ["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa", "best-practice"] });
        return found.violations.map(({ id, help, nodes }) => `${id}: ${help} (${nodes.map((node) => node.target.join(" ")).join("; ")})`);
      });
      expect(violations, `axe on ${page.url()}`).toEqual([]);
    });
  },

  complaints: [
    async ({ page }, use) => {
      const complaints: string[] = [];
      page.on("console", (message) => {
        if (message.type() === "error") complaints.push(message.text());
      });
      page.on("pageerror", (error) => complaints.push(error.message));
      await use(complaints);
      expect(complaints, "the page reported no error").toEqual([]);
    },
    { auto: true },
  ],
});
