import AxeBuilder from "@axe-core/playwright";
import { expect, test } from "@playwright/test";
import { personAt, photograph, type Dress } from "./people";

/** Every page of every role: drawn without a complaint, usable by ear and key as far as a machine can tell, never wider than the screen. */
const visits: Record<string, string[]> = {
  engineer: ["/desk", "/screenings", "/sections", "/screenings/new", "/log", "/account"],
  approver: ["/desk", "/screenings", "/sections", "/log"],
  auditor: ["/desk", "/log", "/log?entry=1"],
  administrator: ["/desk", "/people", "/facilities", "/log"],
};

const dresses: [string, Dress][] = [
  ["desk light", { width: 1440, height: 900 }],
  ["phone dark", { width: 390, height: 844, dark: true }],
];

for (const [dressed, dress] of dresses) {
  for (const [role, addresses] of Object.entries(visits)) {
    test(`${role}'s pages, ${dressed}`, async ({ browser }) => {
      const { page, context, complaints } = await personAt(browser, role, dress);
      for (const address of addresses) {
        await page.goto(address);
        await expect(page.locator("h1:visible").first(), address).toBeVisible();
        await photograph(page, `page-${role}-${address.replace(/\W+/g, "-")}-${dressed.replace(" ", "-")}`);
        const wide = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
        expect(wide, `${address} scrolls sideways by ${wide} px`).toBeLessThanOrEqual(0);
        const { violations } = await new AxeBuilder({ page })
          .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
          .analyze();
        expect(violations.map(({ id, nodes }) => `${address}: ${id} at ${nodes[0]?.target.join(" ")}`)).toEqual([]);
      }
      expect(complaints).toEqual([]);
      await context.close();
    });
  }
}

test("a sheet, its form and a refusal, by both dresses", async ({ browser }) => {
  for (const [dressed, dress] of dresses) {
    const { page, context, complaints } = await personAt(browser, "engineer", dress);
    await page.goto("/screenings");
    await page.getByRole("link", { name: "SC-0001" }).first().click();
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    await page.waitForTimeout(800);
    await photograph(page, `sheet-${dressed.replace(" ", "-")}`);
    const { violations } = await new AxeBuilder({ page })
      .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
      .analyze();
    expect(violations.map(({ id, nodes }) => `${id} at ${nodes[0]?.target.join(" ")}`)).toEqual([]);
    expect(complaints).toEqual([]);
    const answer = await page.goto("/people");
    expect(answer?.status()).toBeLessThan(500);
    await expect(page.locator("h1:visible").first()).toBeVisible();
    await context.close();
  }
});
