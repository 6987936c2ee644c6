import { expect, test, type Page } from "@playwright/test";
import { addComponent, chooseRadio, giveSource, openPart, typeLine } from "./lines";
import { personAt, photograph } from "./people";

/**
 * A half-full propane drum, cold and in a pool fire: level and zones drawn, two cases, both computed, both sheets, side by side, the window of
 * bores and a study. Figures are invented.
 */
const sheet = "DS-E2E rev A";
const line = (page: Page, key: string) => page.locator(`[id="line-${key}"]`);
const choose = (page: Page, key: string, label: string) => page.locator(`[id="value-${key}"]`).selectOption({ label });

test("a propane drum with a level, cold and in a pool fire", async ({ browser }) => {
  test.setTimeout(480_000); // two cases run twice each, a search for bores and a study, on a machine that may be busy
  const { page, context, complaints } = await personAt(browser, "engineer");
  const forerun = page.getByRole("complementary", { name: "Forerun" });

  await test.step("the inventory is drawn to scale with its level", async () => {
    await page.getByRole("link", { name: "New screening" }).first().click();
    const option = await page.getByLabel("Section").locator("option", { hasText: "IS-31" }).first().textContent();
    await page.getByLabel("Section").selectOption({ label: option ?? "" });
    await page.getByLabel("Title on the sheet").fill("Propane drum, cold and in fire");
    await page.getByRole("button", { name: "Start the screening" }).click();
    await openPart(page, "Inventory");
    await typeLine(page, { key: "2.01-1", text: "D-3101" });
    await typeLine(page, { key: "2.04-1", text: "1.8 m", source: sheet });
    await typeLine(page, { key: "2.05-1", text: "6", source: sheet });
    await chooseRadio(page, "2.08", "Temperature and liquid");
    await expect(line(page, "2.09")).toHaveCount(0);
    await typeLine(page, { key: "2.10", text: "25", source: sheet });
    await typeLine(page, { key: "2.07-1", text: "2.5", source: sheet });
    await expect(page.getByRole("img", { name: /D-3101: a horizontal cylinder/ })).toBeVisible();
    await typeLine(page, { key: "2.07-1", text: "0.9" });
    await expect(page.getByRole("img", { name: /liquid to 0\.900\sm/ })).toBeVisible();
    await expect(page.getByText("Liquid-wetted wall")).toBeVisible();
    await expect(line(page, "2.15").getByRole("textbox")).toHaveValue(/^8\.39/);
  });

  await test.step("fluid, steel and opening", async () => {
    await openPart(page, "Fluid");
    await addComponent(page, "C3", "Propane", "100");
    await giveSource(page, '[id="line-3.01"]', "supplier's certificate");
    await openPart(page, "Steel");
    await typeLine(page, { key: "4.03", text: "22", source: sheet });
    await typeLine(page, { key: "4.05", text: "-46", source: sheet });
    await expect(line(page, "4.16").getByRole("textbox")).toHaveValue(/^7\d{3}/);
    await openPart(page, "Release path");
    await typeLine(page, { key: "A5.02", text: "60", source: "PID E2E" });
    await openPart(page, "Heat");
    await typeLine(page, { key: "A6.08", text: "200", source: "boiling propane, order of magnitude" });
    await openPart(page, "Limits");
    await line(page, "A7.09").getByRole("button", { name: "Set here" }).click();
    await typeLine(page, {
      key: "A7.09",
      text: "2 barg",
      source: "half of the design pressure is not reached; 2 bar by the site's own rule",
    });
    await expect(line(page, "A7.09").locator("..")).toContainText("Stricter than the policy");
    await expect(forerun.getByText("Peak vent load")).toBeVisible({ timeout: 60_000 });
  });

  await test.step("a fire case begins with the lines of the cold one", async () => {
    await openPart(page, "Heat");
    await page.getByRole("button", { name: "Add a fire case" }).click();
    await expect(page.getByRole("radio", { name: /^Pool fire/ })).toBeChecked();
    await choose(page, "B6.12", "Adequate");
    await typeLine(page, { key: "B6.13", text: "1.5" });
    await expect(line(page, "B6.13")).toContainText(/too high.*to 1/);
    await typeLine(page, { key: "B6.13", text: "1", source: "bare vessel" });
    await expect(forerun.getByText("case B,", { exact: false })).toBeVisible();
    await chooseRadio(page, "B6.02", "Surface fire");
    await expect(line(page, "B6.12")).toHaveCount(0);
    await chooseRadio(page, "B6.02", "Pool fire");
    await expect(page.locator('[id="value-B6.12"]')).toHaveValue("adequate");
    await photograph(page, "drum-1-form");
  });

  await test.step("both cases stand on the sheet with their curves and cautions", async () => {
    await page.getByRole("button", { name: "Compute in full" }).click();
    await expect(page).toHaveURL(/\/screenings\/[0-9a-f-]{36}$/, { timeout: 90_000 });
    await expect(page.getByRole("region", { name: "Run of case B" })).toBeVisible({ timeout: 45_000 });
    await expect(page.getByText("This is a screening. It does not size, rate or approve equipment.").first()).toBeVisible();
    await expect(page.getByText(/The fire is a uniform heat flux/).first()).toBeVisible();
    await expect(page.getByRole("img", { name: "Liquid level over the same time." }).first()).toBeVisible();
    await photograph(page, "drum-2-sheet");
  });
  const address = page.url();

  await test.step("they lie side by side", async () => {
    await page.getByRole("link", { name: "Side by side" }).click();
    await expect(page.getByRole("heading", { level: 1 })).toContainText(/lines? differ/);
    await expect(page.getByRole("table", { name: "Lines that differ" }).getByText("Pool fire, wetted area")).toBeVisible();
    await photograph(page, "drum-3-compare");
  });

  await test.step("the window of bores is looked for in the browser", async () => {
    await page.goto(`${address}/window`);
    await expect(page.getByRole("img", { name: /bore/i })).toBeVisible({ timeout: 90_000 });
    await expect(page.getByRole("slider")).toBeVisible();
    await photograph(page, "drum-4-window");
  });

  await test.step("one input at a time", async () => {
    await page.goto(`${address}/studies`);
    await page.getByRole("button", { name: "Vary one input at a time" }).click();
    await expect(page.getByRole("group", { name: "One input at a time" })).toBeVisible({ timeout: 120_000 });
    await photograph(page, "drum-5-study");
  });

  expect(complaints).toEqual([]);
  await context.close();
});
