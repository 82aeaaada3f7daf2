import { signIn } from "./setup/sign-in.ts";
import { expect, test } from "./setup/test.ts";

test("a helper finds no price, no delivery and nothing to reserve with, on the page or behind it", async ({ page }) => {
  await signIn(page, "joel@millrace.example");
  await page.goto("/boards");
  await expect(page.getByRole("link", { name: "Deliveries" })).toHaveCount(0);
  await page.locator("main ul a[href^='/boards/']").first().click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/^[A-Z]+-\d+$/);
  await expect(page.getByText("Cost", { exact: true })).toHaveCount(0);
  await expect(page.getByRole("link", { name: "Reserve for a project" })).toHaveCount(0);
  const board = new URL(page.url()).pathname;
  for (const path of [`${board}/reserve`, "/deliveries", "/settings", "/people"]) {
    const answer = await page.goto(path);
    expect(answer?.status(), path).toBe(403);
    await expect(page.getByRole("heading", { name: "Not yours to do" })).toBeVisible();
  }
});

test("the main pages work without JavaScript", async ({ page, browser }) => {
  await signIn(page, "joel@millrace.example");
  const plain = await browser.newContext({
    javaScriptEnabled: false,
    storageState: await page.context().storageState(),
  });
  const without = await plain.newPage();
  await without.goto("/boards");
  await without.getByLabel("Rings").selectOption("rift");
  await without.getByRole("button", { name: "Show" }).click();
  await expect(without).toHaveURL(/rings=rift/);
  await without.locator("main ul a[href^='/boards/']").first().click();
  await without.getByRole("link", { name: "Moisture" }).click();
  await without.getByLabel("Meter says").fill("lots");
  await without.getByRole("button", { name: "Keep the reading" }).click();
  await expect(without.getByLabel("Meter says")).toHaveValue("lots");
  await expect(without.getByLabel("Meter says")).toHaveAttribute("aria-invalid", "true");
  await without.getByLabel("Meter says").fill("7.9");
  await without.getByRole("button", { name: "Keep the reading" }).click();
  await expect(without.getByText("7.9 %").first()).toBeVisible();
  await plain.close();
});
