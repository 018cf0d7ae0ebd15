import { randomUUID } from "node:crypto";
import { DESK, expect, PHONE, test } from "./setup/test";

const BASE = "/o/millrace-metals";

type Earnings = { salesMinor: number; costsMinor: number; netMinor: number; quantity: string };

/** Today where the demo outfit is. */
const today = () => new Intl.DateTimeFormat("en-CA", { timeZone: "America/New_York" }).format(new Date());

for (const [name, viewport] of [
  ["phone", PHONE],
  ["desk", DESK],
] as const) {
  test.describe(`on a ${name}`, () => {
    test.use({ viewport });

    test("a haul is logged, weighed in, sold and paid, and the month's numbers move by exactly what was entered", async ({ page, signInAs, complaints }) => {
      await signInAs("owner");
      const month = today().slice(0, 7);
      const earnings = async () => (await (await page.request.get(`/api${BASE}/earnings?month=${month}`)).json()) as Earnings;
      const before = await earnings();

      await page.goto(`${BASE}/pickups/new`);
      await page.getByRole("button", { name: "One Microwave more" }).click();
      await page.getByRole("button", { name: /Save haul/ }).click();
      await expect(page).toHaveURL(/\/pickups\/[0-9a-f-]{36}(\?|$)/);
      const pickupId = new URL(page.url()).pathname.split("/").at(-1) ?? "";

      await page.goto(`${BASE}/bins/weigh-in?pickup=${pickupId}`);
      if (await page.getByRole("button", { name: "More grades" }).isVisible()) await page.getByRole("button", { name: "More grades" }).click();
      await page.getByRole("button", { name: "Copper transformer" }).click();
      await page.getByLabel(/gross/).fill("30.25");
      await page.getByLabel(/tare/).fill("10.25");
      await page.getByRole("button", { name: /Put in bin/ }).click();
      await expect(page.getByText(/20\.00 lb in TR-1/)).toBeVisible();

      const number = `E2E-${randomUUID().slice(0, 8)}`;
      await page.goto(`${BASE}/tickets/new`);
      await page.getByLabel("Yard", { exact: true }).selectOption({ label: "Pell Street Scrap" });
      await page.getByLabel("Their ticket").fill(number);
      await page.getByLabel("Our grade").selectOption({ label: "Copper transformer" });
      await page.getByLabel("Gross, lb").fill("25.0");
      await page.getByLabel("Tare, lb").fill("5.0");
      await page.getByLabel("Price, USD").fill("0.45");
      await page.getByLabel("Amount, USD").fill("9.10");
      await expect(page.getByText("the sum gives $9.00")).toBeVisible();
      await page.getByRole("button", { name: "Accept ticket" }).click();
      await expect(page.getByRole("alert").filter({ hasText: "There is a problem" })).toBeVisible();
      // The browser reports the refusal that the test meant to cause.
      expect(complaints.splice(0)).toHaveLength(1);
      await page.getByLabel("Amount, USD").fill("9.00");
      await expect(page.getByText("the sum gives $9.00")).toBeHidden();
      await page.getByRole("button", { name: "Accept ticket" }).click();
      await expect(page.getByRole("heading", { name: `Ticket ${number}` })).toBeVisible();
      await page.getByRole("button", { name: "Record payment" }).click();
      await expect(page.getByText("Left to pay")).toBeHidden();

      await page.goto(`${BASE}/money/costs/new`);
      await page.getByLabel(/Amount/).fill("12.34");
      await page
        .getByRole("button", { name: /Save|Record|Add/ })
        .first()
        .click();
      await expect(page).not.toHaveURL(/\/new$/);

      const after = await earnings();
      expect(after.salesMinor - before.salesMinor).toBe(900);
      expect(after.costsMinor - before.costsMinor).toBe(1234);

      await page.goto(`${BASE}/money/books-check`);
      await expect(page.getByText(/does not hold/i)).toHaveCount(0);
    });
  });
}
