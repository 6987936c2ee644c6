import AxeBuilder from "@axe-core/playwright";
import { expect, test, type Page } from "@playwright/test";
import { openPart } from "./lines";
import { personAt, photograph, type Dress } from "./people";

/** The fluid of a screening and the change of state, as an engineer, an auditor and a phone meet them. Figures are invented. */
const report = ["Methane\t80", "Ethane\t8", "Propane\t4", "n-C4\t2.5", "n-C5\t1", "n-C6\t.9", "N2\t1.6", "CO2\t2"].join("\n");
const field = (page: Page, name: string) => page.getByRole("textbox", { name, exact: true });

async function noViolations(page: Page, where: string): Promise<void> {
  const wide = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
  expect(wide, `${where} scrolls sideways by ${wide} px`).toBeLessThanOrEqual(0);
  const { violations } = await new AxeBuilder({ page })
    .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
    .analyze();
  expect(violations.map(({ id, nodes }) => `${where}: ${id} at ${nodes[0]?.target.join(" ")}`)).toEqual([]);
}

test("a rich gas from its lines to its page, and on to a change of state", async ({ browser }) => {
  test.setTimeout(300_000); // five pages, and the engine starting anew on each of them
  const { page, context, complaints } = await personAt(browser, "engineer");

  await test.step("the phase diagram follows the composition while it is typed", async () => {
    await page.goto("/screenings/new");
    const label = await page.getByLabel("Section").locator("option", { hasText: "IS-08" }).first().textContent();
    await page.getByLabel("Section").selectOption({ label: label ?? "" });
    await page.getByLabel("Title on the sheet").fill("Rich gas");
    await page.getByRole("button", { name: "Start the screening" }).click();
    await openPart(page, "Fluid");
    await expect(page.getByText("It is drawn once the composition can be used.")).toBeVisible();
    await page.getByRole("button", { name: "Paste a table" }).click();
    await page.getByLabel("Two columns: component and mol %").fill(report);
    await page.getByRole("button", { name: /^Use 8 rows/ }).click();
    await expect(page.getByRole("img", { name: /critical point at/ })).toBeVisible({ timeout: 30_000 });
  });

  await test.step("its page gives both phases at a state, and every equation beside the one in use", async () => {
    await page.getByRole("link", { name: "Properties and equations side by side" }).click();
    await expect(page.getByRole("heading", { level: 1, name: "Fluid" })).toBeVisible({ timeout: 30_000 });
    await field(page, "Pressure, state").fill("40 bar(a)");
    await field(page, "Temperature, state").fill("-20");
    await field(page, "Temperature, state").blur();
    await expect(page.getByText(/^Vapour and liquid, \d\d\.\d.% vapour by mole\.$/)).toBeVisible({ timeout: 30_000 });
    await expect(page.getByRole("table", { name: "Composition of the phases" })).toBeVisible();
    const equations = page.getByRole("table", { name: "Equations of state side by side" });
    await expect(equations.getByRole("row", { name: /Peng–Robinson 1976/ })).toContainText("in use");
    await expect(equations.getByRole("row", { name: /GERG-2008 First choice/ })).toContainText("is the measure");
    await expect(page.getByText("This is a screening. It does not size, rate or approve equipment.").first()).toBeVisible();
  });

  await test.step("the diagram is read with the keys", async () => {
    await page.getByRole("group", { name: "Chart. Arrow keys read the curves." }).first().focus();
    await page.keyboard.press("End");
    for (let step = 0; step < 35; step++) await page.keyboard.press("ArrowLeft");
    await expect(page.getByText(/^at .*dew line .*bar\(a\)/)).toBeVisible();
    await photograph(page, "fluid-engineer");
    await noViolations(page, "the fluid");
  });

  await test.step("a reload brings the state back", async () => {
    await page.reload();
    await expect(field(page, "Temperature, state")).toHaveValue("-20");
  });

  await test.step("the change of state starts with this fluid, and its case file is one the command line takes", async () => {
    await page.getByRole("main").getByRole("link", { name: "Change of state" }).click();
    await expect(field(page, "Methane, mol %")).toHaveValue("80", { timeout: 30_000 });
    const state = [
      ["Pressure, from", "70 bar(a)"],
      ["Temperature, from", "35"],
      ["Pressure, to", "15 bar(a)"],
      ["Temperature, to", "-40"],
    ] as const;
    for (const [name, text] of state) {
      await field(page, name).fill(text);
      await field(page, name).blur();
    }
    const steps = page.getByRole("table", { name: "Steps of internal energy, enthalpy and entropy" });
    await expect(steps.getByRole("row")).toHaveCount(5, { timeout: 30_000 });
    await expect(page.getByText(/Positive: at the first state the real fluid has/)).toBeVisible();
    const [download] = await Promise.all([
      page.waitForEvent("download"),
      page.getByRole("button", { name: "Case file" }).click(),
    ]);
    expect(download.suggestedFilename()).toBe("change-of-state.json");
    await photograph(page, "change-of-state-engineer");
    await noViolations(page, "the change of state");
  });

  expect(complaints).toEqual([]);
  await context.close();
});

const dresses: [string, string, Dress][] = [
  ["an auditor, desk dark", "auditor", { width: 1440, height: 900, dark: true }],
  ["an approver, phone", "approver", { width: 390, height: 844 }],
  ["an engineer, phone dark", "engineer", { width: 390, height: 844, dark: true }],
];
const change = "#z=methane~70|n_heptane~20|water~10&eq=peng-robinson-1976&kij=library&from=30 bar(a);27 °C&to=5 bar(a);0 °C";

for (const [words, role, dress] of dresses) {
  test(`three phases in a change of state, for ${words}`, async ({ browser }) => {
    const { page, context, complaints } = await personAt(browser, role, dress);
    await page.goto(`/change-of-state${change}`);
    await expect(page.getByText(/^Vapour, liquid and water, /).first()).toBeVisible({ timeout: 30_000 });
    await expect(page.getByRole("table", { name: "Equations of state side by side" })).toBeVisible({ timeout: 30_000 });
    await photograph(page, `change-of-state-${role}-${dress.width}`);
    await noViolations(page, words);
    expect(complaints).toEqual([]);
    await context.close();
  });
}

test("the change of state is no page of an administrator", async ({ browser }) => {
  const { page, context } = await personAt(browser, "administrator");
  await page.goto("/change-of-state");
  await expect(page.getByRole("heading", { level: 1 })).toContainText("not open to your role");
  await context.close();
});
