import { expect, test } from "@playwright/test";

/** Cookies and passkeys are bound to one host name, so there is one address; the bare number leads to it. */
test.describe("the one address", () => {
  test("is where the bare number leads, path and query kept", async ({ page, baseURL }) => {
    const { port } = new URL(baseURL ?? "");
    const answer = await page.request.get(`http://127.0.0.1:${port}/desk?page=2`, { maxRedirects: 0 });
    expect(answer.status()).toBe(308);
    expect(answer.headers().location).toBe(`http://localhost:${port}/desk?page=2`);

    await page.goto(`http://127.0.0.1:${port}/`);
    expect(new URL(page.url()).host).toBe(`localhost:${port}`);
  });

  test("is well, and says nothing more", async ({ request }) => {
    const answer = await request.get("/api/v1/health");
    expect(answer.status()).toBe(200);
    expect(await answer.json()).toEqual({ status: "ok", database: true, migrated: true });
  });

  test("shows the first page to a stranger without a complaint of the browser", async ({ page }) => {
    const complaints: string[] = [];
    page.on("console", (message) => (message.type() === "error" ? complaints.push(message.text()) : undefined));
    page.on("pageerror", (error) => complaints.push(error.message));
    await page.goto("/");
    await expect(page).toHaveURL(/\/sign-in/);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
    expect(complaints).toEqual([]);
  });
});
