import { endPicture } from "./setup/end-picture.ts";
import { signIn } from "./setup/sign-in.ts";
import { expect, test } from "./setup/test.ts";

test.setTimeout(90_000);

test("the reader proposes the end and its rings, follows a dragged corner, and its word is kept with the photo", async ({
  page,
}) => {
  await signIn(page, "priya@millrace.example");
  await page.goto("/boards?species=northern-red-oak&rings=unread");
  await page.locator("main ul a[href^='/boards/']").first().click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/^RO-\d+$/);
  const boardUrl = page.url();
  const size = { widthMm: 190, thicknessMm: 25.4 };
  const picture = await endPicture(size, { xMm: -110, yMm: 200 });
  await page
    .getByLabel("Choose a file")
    .setInputFiles({ name: "end.jpg", mimeType: "image/jpeg", buffer: picture.jpeg });

  const photo = page.getByRole("group", { name: /mark its corners and rings/ });
  await expect(photo.locator("polyline").first()).toBeAttached({ timeout: 20_000 });
  await expect(page.getByText(/rift, \d+° to \d+°/)).toBeVisible();

  const corner = photo.getByRole("slider", { name: /Corner, top left/ });
  await corner.focus();
  const answered = page.waitForResponse(
    (response) => response.url().includes("/api/photos/") && response.request().method() === "POST",
  );
  await page.keyboard.press("Shift+ArrowRight");
  expect((await answered).status()).toBe(200);

  await page.getByRole("button", { name: "Start over" }).click();
  await page.getByRole("button", { name: "Keep this reading" }).click();
  await expect(page).toHaveURL(boardUrl);
  await expect(page.getByText(/read from a photo, Priya Lund/)).toBeVisible();
});

test("a photo of no board's end is no confident answer", async ({ page }) => {
  await signIn(page, "priya@millrace.example");
  await page.goto("/boards?species=yellow-birch&rings=unread");
  await page.locator("main ul a[href^='/boards/']").first().click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/^YB-\d+$/);
  const black = Buffer.from(
    await (await import("sharp"))
      .default({ create: { width: 900, height: 500, channels: 3, background: "#000" } })
      .jpeg()
      .toBuffer(),
  );
  await page.getByLabel("Choose a file").setInputFiles({ name: "black.jpg", mimeType: "image/jpeg", buffer: black });
  await expect(page.getByRole("heading", { name: /^Rings of/ })).toBeVisible();
  await expect(page.getByRole("status").filter({ hasText: /could not be found|nothing to see|No rings/ })).toBeVisible({
    timeout: 20_000,
  });
  await page.getByRole("button", { name: "Keep this reading" }).click();
  await expect(page.getByRole("alert")).toContainText("Not kept");
});
