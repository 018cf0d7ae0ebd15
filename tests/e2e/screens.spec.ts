import { DESK, expect, PHONE, test, type Role } from "./setup/test";

const BASE = "/o/millrace-metals";

const PAGES: Record<Role, string[]> = {
  owner: [
    "",
    "/requests",
    "/pickups",
    "/pickups/new",
    "/bench",
    "/bins",
    "/bins/new",
    "/bins/weigh-in",
    "/bins/count",
    "/loads",
    "/tickets",
    "/tickets/new",
    "/prices",
    "/prices/sheets",
    "/prices/sheets/new",
    "/prices/yards",
    "/prices/yards/new",
    "/money/costs",
    "/money/costs/new",
    "/money/entries",
    "/money/movements",
    "/money/books-check",
    "/crew",
    "/settings",
  ],
  bookkeeper: ["", "/bins", "/tickets", "/money/costs", "/prices"],
  collector: ["", "/pickups", "/pickups/new", "/tickets", "/tickets/new", "/money/costs", "/crew", "/settings"],
  sorter: ["", "/bins", "/bins/weigh-in", "/bins/count", "/tickets", "/money/costs/new"],
};

/** Where the look differs most: a phone by day and a desk by night, and the other way round. */
const LOOKS = [
  { name: "phone, light", viewport: PHONE, colorScheme: "light" },
  { name: "desk, dark", viewport: DESK, colorScheme: "dark" },
  { name: "phone, dark", viewport: PHONE, colorScheme: "dark" },
  { name: "desk, light", viewport: DESK, colorScheme: "light" },
] as const;

for (const { name, viewport, colorScheme } of LOOKS) {
  test.describe(name, () => {
    test.use({ viewport, colorScheme });
    test.setTimeout(240_000);

    for (const role of Object.keys(PAGES) as Role[]) {
      test(`every screen of the ${role} opens, fits, and has nothing that axe finds`, async ({ page, signInAs, expectAccessible }) => {
        await signInAs(role);
        for (const path of PAGES[role]) {
          const answer = await page.goto(BASE + path);
          expect(answer?.status(), path).toBe(200);
          await expect(page.locator("h1").first()).toBeVisible();
          // Tall enough that no control lies half under the foot, which would make it look smaller than it is.
          await page.setViewportSize({ width: viewport.width, height: 3000 });
          await expectAccessible();
          await page.setViewportSize(viewport);
          if (viewport === PHONE) {
            await page.setViewportSize({ width: 320, height: 640 });
            expect(await page.evaluate(() => document.documentElement.scrollWidth), `${path} at 320 px`).toBeLessThanOrEqual(320);
            await page.setViewportSize(PHONE);
          }
        }
      });
    }

    test("the pages before an outfit open, fit, and have nothing that axe finds", async ({ page, expectAccessible }) => {
      for (const path of ["/", "/sign-in", "/sign-up", "/docs/api"]) {
        const answer = await page.goto(path);
        expect(answer?.status(), path).toBe(200);
        await expectAccessible();
        expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth), path).toBeLessThanOrEqual(0);
      }
    });
  });
}

test("a sorter and a collector do not find the earnings", async ({ page, signInAs, complaints }) => {
  for (const role of ["sorter", "collector"] as const) {
    await page.context().clearCookies();
    await signInAs(role);
    const answer = await page.goto(`${BASE}/money/2026-01`);
    expect(answer?.status()).toBe(404);
  }
  // The browser reports each 404 itself.
  complaints.splice(0);
});

test("a signed-out person is asked to sign in and then comes back", async ({ page }) => {
  await page.goto(`${BASE}/bins`);
  await expect(page).toHaveURL(/\/sign-in/);
  await page.getByLabel("Email").fill("inez@millrace.example");
  await page.getByLabel("Password").fill("calder falls demo metal");
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(new RegExp(BASE));
});

test("a new person starts a ledger, invites a sorter, and the sorter joins by the link", async ({ page, browser, baseURL }) => {
  const tag = Math.trunc(Date.now() / 1000).toString(36);
  await page.goto("/sign-up");
  await page.getByLabel("Your name").fill("Wren Aldous");
  await page.getByLabel("Email").fill(`wren-${tag}@example.com`);
  await page.getByLabel("Password").fill("three quiet copper herons");
  await page.getByLabel("Outfit name").fill(`Heron Metals ${tag}`);
  await page.getByRole("button", { name: "Start a ledger" }).click();
  await expect(page).toHaveURL(/\/o\/heron-metals/);
  const base = new URL(page.url()).pathname;
  await page.goto(`${base}/crew`);
  await page.getByLabel("As").selectOption("sorter");
  await page.getByRole("button", { name: "Make a link" }).click();
  const link = await page.getByLabel("Link to send").inputValue();
  const other = await browser.newContext();
  const guest = await other.newPage();
  await guest.goto(new URL(new URL(link).pathname, baseURL).href);
  await guest.getByLabel("Your name").fill("Piet Lark");
  await guest.getByLabel("Email").fill(`piet-${tag}@example.com`);
  await guest.getByLabel("Password").fill("slow river stones remember");
  await guest.getByRole("button", { name: "Join" }).click();
  await expect(guest).toHaveURL(new RegExp(base));
  await expect(guest.getByRole("link", { name: /Weigh in|Add a bin/ }).first()).toBeVisible();
  await other.close();
});
