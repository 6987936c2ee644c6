import { expect, test, type Page } from "@playwright/test";
import { kept, openPart, typeLine } from "./lines";
import { personAt } from "./people";

/** Whatever happens to tab, connection or a second person: what was typed stays, and nobody is overwritten silently. */
async function startScreening(page: Page, title: string): Promise<string> {
  await page.goto("/screenings/new");
  await page.getByLabel("Section").selectOption({ index: 1 });
  await page.getByLabel("Title on the sheet").fill(title);
  await page.getByRole("button", { name: "Start the screening" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Scope" })).toBeVisible();
  return page.url().replace(/\/form\/.*$/, "");
}

const thickness = (page: Page) => page.locator('[id="value-4.03"]');

test("the unit switch changes what is shown and never the stored value", async ({ browser }) => {
  const { page, complaints } = await personAt(browser, "engineer");
  await startScreening(page, "Units");
  await openPart(page, "Steel");
  await typeLine(page, { key: "4.03", text: "1 in" });
  await expect(thickness(page)).toHaveValue("1");
  const unit = page.locator('[id="line-4.03"]').getByRole("combobox").first();
  await expect(unit).toHaveValue("in");
  await unit.selectOption("mm");
  await expect(thickness(page)).toHaveValue("25.4");
  await page.getByRole("button", { name: "US", exact: true }).click();
  await expect(thickness(page)).toHaveValue(/^1(\.0+)?$/);
  await page.getByRole("button", { name: "SI", exact: true }).click();
  await kept(page);
  await page.reload();
  await expect(thickness(page)).toHaveValue("25.4");
  expect(complaints).toEqual([]);
});

test("what is wrong is said at the line with the range that holds, and stays typed", async ({ browser }) => {
  const { page } = await personAt(browser, "engineer");
  await startScreening(page, "Errors");
  await openPart(page, "Steel");
  await typeLine(page, { key: "4.03", text: "9000" });
  const line = page.locator('[id="line-4.03"]');
  await expect(line).toContainText(/too high.*0\.5.* to 500.*\smm/s);
  await expect(thickness(page)).toHaveAttribute("aria-invalid", "true");
  await typeLine(page, { key: "4.03", text: "twelve" });
  await expect(line).toContainText("has no number in front");
  await kept(page);
  await page.reload();
  await expect(thickness(page)).toHaveValue("twelve");
});

test("a dropped connection is said, and sent when it is back", async ({ browser }) => {
  const { page, context } = await personAt(browser, "engineer");
  await startScreening(page, "Offline");
  await openPart(page, "Steel");
  await context.setOffline(true);
  await typeLine(page, { key: "4.03", text: "31.8" });
  await expect(page.getByText(/^Not kept since/)).toBeVisible();
  await expect(page.getByText("The server can't be reached.", { exact: false })).toBeVisible();
  await context.setOffline(false);
  await kept(page);
  await page.reload();
  await expect(thickness(page)).toHaveValue("31.8");
});

test("a tab that dies before the save gives back what was typed", async ({ browser }) => {
  const { page, context } = await personAt(browser, "engineer");
  const address = await startScreening(page, "Crash");
  await page.goto(`${address}/form/steel`);
  await context.setOffline(true);
  await typeLine(page, { key: "4.03", text: "28.6" });
  await expect(page.getByText(/^Not kept since/)).toBeVisible();
  await page.close({ runBeforeUnload: false });

  await context.setOffline(false);
  const again = await context.newPage();
  await again.goto(`${address}/form/steel`);
  await expect(again.getByText("Brought back from this browser.")).toBeVisible();
  await expect(thickness(again)).toHaveValue("28.6");
  await kept(again);
});

test("two tabs: lines of one are taken over, a line of both is put to choice", async ({ browser }) => {
  const { page, context } = await personAt(browser, "engineer");
  const address = await startScreening(page, "Two tabs");
  await page.goto(`${address}/form/steel`);
  const other = await context.newPage();
  await other.goto(`${address}/form/steel`);
  await typeLine(other, { key: "4.03", text: "20" });
  await typeLine(other, { key: "4.05", text: "-46" });
  await kept(other);
  await other.waitForTimeout(1500);

  await typeLine(page, { key: "4.03", text: "25" });
  const dialog = page.getByRole("dialog");
  await expect(dialog).toContainText("Changed elsewhere");
  await expect(dialog).not.toContainText("4.05");
  await dialog.getByRole("radio", { name: /20 mm/ }).check();
  await dialog.getByRole("button", { name: "Keep these" }).click();
  await expect(dialog).toBeHidden();
  await expect(thickness(page)).toHaveValue("20");
  await expect(page.locator('[id="value-4.05"]')).toHaveValue("-46");
  await kept(page);
});
