import { expect, type Browser, type Page } from "@playwright/test";

type Account = { badge: string; role: string; printedName: string; password: string };

/** Accounts of the demo, as the command that loaded it printed them. */
const accounts = JSON.parse(process.env.E2E_ACCOUNTS ?? "[]") as Account[];

export function accountOf(role: string): Account {
  const found = accounts.find((account) => account.role === role);
  if (!found) throw new Error(`E2E_ACCOUNTS names no ${role}`);
  return found;
}

export async function signIn(page: Page, role: string): Promise<Account> {
  const account = accountOf(role);
  await page.goto("/sign-in");
  await page.getByLabel("Badge", { exact: false }).first().fill(account.badge);
  await page.getByLabel("Password", { exact: true }).fill(account.password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/desk$/);
  return account;
}

export type Dress = { width: number; height: number; dark?: boolean };

/** A person at a browser of their own, signed in; complaints of the page are collected and must stay empty. */
export async function personAt(browser: Browser, role: string, dress: Dress = { width: 1440, height: 900 }) {
  const context = await browser.newContext({
    viewport: { width: dress.width, height: dress.height },
    colorScheme: dress.dark ? "dark" : "light",
  });
  const page = await context.newPage();
  const complaints: string[] = [];
  page.on("console", (message) => {
    if (message.type() === "error") complaints.push(message.text());
  });
  page.on("pageerror", (error) => complaints.push(error.message));
  const account = await signIn(page, role);
  return { page, context, account, complaints };
}

/** Photographs a page into the folder of the test run. */
export async function photograph(page: Page, name: string): Promise<void> {
  await page.screenshot({ path: `${process.env.E2E_SCREENS ?? ".ebbmark/screens"}/${name}.png`, fullPage: true });
}
