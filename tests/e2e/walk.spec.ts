import { expect, test, type Page } from "@playwright/test";
import { addComponent, chooseRadio, giveSource, openPart, typeLine } from "./lines";
import { accountOf, personAt, photograph } from "./people";

/**
 * Three people take one screening from nothing to a verified entry: the engineer describes, computes and signs; the approver decides; the
 * auditor finds it in the log and recomputes its seal. Figures are invented.
 */
type Screening = {
  name: string;
  section: string;
  title: string;
  describe: (page: Page) => Promise<void>;
  sentence: RegExp;
};

const sheet = "DS-E2E rev A";

const bottleBank: Screening = {
  name: "nitrogen bottle bank at 200 bar",
  section: "IS-52",
  title: "Bottle bank, emptied through one orifice",
  describe: async (page) => {
    await openPart(page, "Inventory");
    await typeLine(page, { key: "2.01-1", text: "B-5201 to B-5212" });
    await chooseRadio(page, "2.02-1", "Plain volume");
    await typeLine(page, { key: "2.06-1", text: "600 L", source: sheet });
    await typeLine(page, { key: "2.09", text: "200", source: sheet });
    await typeLine(page, { key: "2.10", text: "15", source: "site climate" });
    await openPart(page, "Fluid");
    await addComponent(page, "N2", "Nitrogen", "100");
    await giveSource(page, '[id="line-3.01"]', "supplier's certificate");
    await openPart(page, "Steel");
    await typeLine(page, { key: "4.03", text: "6", source: sheet });
    await typeLine(page, { key: "4.04", text: "14", source: sheet });
    await typeLine(page, { key: "4.05", text: "-46", source: sheet });
    await openPart(page, "Release path");
    await typeLine(page, { key: "A5.02", text: "6", source: "PID E2E" });
    await openPart(page, "Heat");
    await typeLine(page, { key: "A6.08", text: "25", source: "free convection, order of magnitude" });
  },
  sentence: /minimum design metal temperature|target/,
};

const exportLoop: Screening = {
  name: "methane export loop at 70 bar",
  section: "IS-08",
  title: "Export loop, warm steel",
  describe: async (page) => {
    await openPart(page, "Inventory");
    await typeLine(page, { key: "2.01-1", text: "D-0801" });
    await typeLine(page, { key: "2.04-1", text: "47.24 in", source: sheet });
    await typeLine(page, { key: "2.05-1", text: "6", source: sheet });
    await typeLine(page, { key: "2.09", text: "1015 psig", source: sheet });
    await typeLine(page, { key: "2.10", text: "35", source: sheet });
    await openPart(page, "Fluid");
    await addComponent(page, "C1", "Methane", "98.2");
    await addComponent(page, "74-84-0", "Ethane", "1.3");
    await page.getByRole("button", { name: "Normalise and keep both columns" }).click();
    await giveSource(page, '[id="line-3.01"]', "gas analysis, November");
    await openPart(page, "Steel");
    await typeLine(page, { key: "4.03", text: "45", source: sheet });
    await typeLine(page, { key: "4.05", text: "-29", source: sheet });
    await openPart(page, "Release path");
    await typeLine(page, { key: "A5.02", text: "11", source: "PID E2E" });
    await openPart(page, "Heat");
    await typeLine(page, { key: "A6.08", text: "120", source: "free convection at settle-out" });
  },
  sentence: /target|minimum design metal temperature/,
};

for (const [at, screening] of [bottleBank, exportLoop].entries()) {
  test(`three people and a ${screening.name}`, async ({ browser }) => {
    test.setTimeout(300_000); // five signed-in stretches, each with its own browser
    const dark = at === 1;
    const engineer = await personAt(browser, "engineer", { width: 1440, height: 900, dark });
    const { page } = engineer;
    let record = "";

    await test.step("the engineer describes it and sees the curves follow", async () => {
      await page.getByRole("link", { name: "New screening" }).first().click();
      await page.getByLabel("Section").selectOption({ label: await optionOf(page, screening.section) });
      await page.getByLabel("Title on the sheet").fill(screening.title);
      await page.getByRole("button", { name: "Start the screening" }).click();
      await expect(page.getByRole("heading", { level: 1, name: "Scope" })).toBeVisible();
      await screening.describe(page);
      await expect(page.getByRole("complementary", { name: "Forerun" }).getByText("Peak vent load")).toBeVisible({
        timeout: 45_000,
      });
      await photograph(page, `walk-${at}-1-form`);
      record =
        (await page
          .getByText(/^SC-\d{4}$/)
          .first()
          .textContent()) ?? "";
    });

    await test.step("the server's own run stands on the sheet, cautions before the charts", async () => {
      await page.getByRole("button", { name: "Compute in full" }).click();
      await expect(page).toHaveURL(/\/screenings\/[0-9a-f-]{36}$/);
      await expect(page.getByRole("heading", { level: 1 })).toContainText(screening.sentence, { timeout: 45_000 });
      await expect(page.getByText("This is a screening. It does not size, rate or approve equipment.").first()).toBeVisible();
      await photograph(page, `walk-${at}-2-sheet`);
    });

    await test.step("the engineer signs what is shown", async () => {
      await page.getByRole("link", { name: "Review and sign" }).first().click();
      await expect(page.getByRole("heading", { level: 1, name: "Review and sign" })).toBeVisible();
      await tickAll(page);
      await page.getByLabel("Password, once more").fill(engineer.account.password);
      await photograph(page, `walk-${at}-3-sign`);
      await page.getByRole("button", { name: "Sign and hand over" }).click();
      await expect(page.getByText("Signed and handed over")).toBeVisible();
    });
    const address = page.url().replace(/\/sign$/, "");

    await test.step("the engineer can't decide on own work", async () => {
      await page.goto(`${address}/decide`);
      await expect(page.getByLabel("Password, once more")).toHaveCount(0);
    });

    const approver = await personAt(
      browser,
      "approver",
      at === 0 ? { width: 1440, height: 900 } : { width: 390, height: 844, dark },
    );
    await test.step("the approver finds it waiting and countersigns", async () => {
      await expect(approver.page.getByText(record).first()).toBeVisible();
      await approver.page.goto(`${address}/decide`);
      await photograph(approver.page, `walk-${at}-4-decide`);
      await countersign(approver.page, approver.account.password);
      await expect(approver.page.getByText("Countersigned").first()).toBeVisible();
    });

    const auditor = await personAt(browser, "auditor", { width: 1440, height: 900, dark });
    await test.step("the auditor reads it in the log and recomputes its seal", async () => {
      await auditor.page.goto("/log");
      const row = auditor.page.getByRole("row", { name: new RegExp(`${record}.*[Cc]ountersigned`) });
      await row.getByRole("link").first().click();
      await auditor.page.getByRole("button", { name: "Verify this entry" }).click();
      await expect(auditor.page.getByText(/Seal holds, recomputed in your browser/)).toBeVisible();
      await photograph(auditor.page, `walk-${at}-5-log`);
    });

    for (const person of [engineer, approver, auditor]) {
      expect(person.complaints, `complaints in the browser of ${person.account.badge}`).toEqual([]);
      await person.context.close();
    }
  });
}

async function optionOf(page: Page, tag: string): Promise<string> {
  const label = await page.getByLabel("Section").locator("option", { hasText: tag }).first().textContent();
  if (!label) throw new Error(`no section ${tag}`);
  return label;
}

/** On a phone the decision is the last of five steps; on a desk all stands on one sheet. */
async function countersign(page: Page, password: string): Promise<void> {
  await expect(page.getByText("What was assumed").first()).toBeVisible();
  const next = page.getByRole("button", { name: /^[2-5] / });
  for (let step = 0; step < 5 && (await next.first().isVisible()); step++) {
    await tickAll(page);
    await next.first().click();
  }
  await page.getByRole("radio", { name: /^Countersign/ }).check();
  await tickAll(page);
  await page.getByLabel("Password, once more").fill(password);
  await page.getByRole("button", { name: /^Countersign/ }).click();
}

async function tickAll(page: Page): Promise<void> {
  for (const box of await page.getByRole("checkbox").all()) {
    if (!(await box.isVisible())) continue;
    // A tick before the page has woken up would be taken back; it is given until it stays.
    await expect(async () => {
      await box.check();
      await expect(box).toBeChecked({ timeout: 500 });
    }).toPass();
  }
}

test("the demo names its people", () => {
  for (const role of ["engineer", "approver", "auditor", "administrator"]) expect(accountOf(role).badge).toMatch(/^[A-Z]-\d{3}$/);
});
