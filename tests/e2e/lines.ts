import { expect, type Page } from "@playwright/test";

/** One line as it is typed: key, text, and where it comes from. */
export type TypedLine = { key: string; text: string; source?: string };

export const openPart = async (page: Page, name: string): Promise<void> => {
  await page.getByRole("navigation", { name: "Parts of the screening" }).getByRole("link", { name }).click();
  await expect(page.getByRole("heading", { level: 1, name })).toBeVisible();
};

/** Types a line's value and, where one is given, its source. */
export async function typeLine(page: Page, { key, text, source }: TypedLine): Promise<void> {
  const value = page.locator(`[id="value-${key}"]`);
  await value.fill(text);
  await value.blur();
  if (source !== undefined) await giveSource(page, `[id="line-${key}"]`, source);
}

export async function giveSource(page: Page, within: string, note: string): Promise<void> {
  const line = page.locator(within);
  await line.getByRole("button", { name: /^Source of/ }).click();
  await line.getByRole("textbox", { name: /Which one|Reason/ }).fill(note);
  await line.getByRole("button", { name: "Done" }).click();
}

export const chooseRadio = (page: Page, key: string, label: string) =>
  page.locator(`[id="line-${key}"]`).getByRole("radio", { name: label }).check();

/** Adds a component with its amount, mol %. */
export async function addComponent(page: Page, written: string, name: string, molePercent: string): Promise<void> {
  const field = page.getByLabel("Component to add, by name, formula or CAS number");
  await field.fill(written);
  await field.press("Enter");
  await page.getByRole("textbox", { name: `${name}, mol %`, exact: true }).fill(molePercent);
}

export const kept = (page: Page) => expect(page.getByRole("status").filter({ hasText: /^\d\d:\d\d:\d\d$/ })).toBeVisible();
