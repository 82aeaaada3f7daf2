import { expect, type Page } from "@playwright/test";
import { signInCode } from "./mail.ts";

/** Types an address and the code that is mailed to it, from wherever a stranger was sent to sign in. */
export async function signIn(page: Page, email: string, from = "/rack"): Promise<void> {
  const asked = new Date();
  await page.goto(from);
  await expect(page).toHaveURL(/\/sign-in\?to=/);
  await page.getByLabel("Your e-mail address").fill(email);
  await page.getByRole("button", { name: "Send the code" }).click();
  await expect(page.getByRole("heading", { name: "Type the code" })).toBeVisible();
  await page.getByLabel("Code").fill(await signInCode(email, asked));
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(new RegExp(`${from.replaceAll(/[?.]/g, "\\$&")}$`));
}
