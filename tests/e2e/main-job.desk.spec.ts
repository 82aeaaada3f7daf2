import { devices, type Locator, type Page } from "@playwright/test";
import { codesOnFirstPage } from "#tests/print/read-codes.ts";
import { type EndPicture, endPicture } from "./setup/end-picture.ts";
import { signIn } from "./setup/sign-in.ts";
import { expect, test } from "./setup/test.ts";

const tomasz = "tomasz@millrace.example";
const priya = "priya@millrace.example";

/** Twelve boards as one types them at the tailgate: width, length. */
const tally: [string, string][] = [
  ["8 1/4", "10"],
  ["7", "9'6\""],
  ["6 1/2", "10"],
  ["9", "8"],
  ["7 3/4", "10'6\""],
  ["5 1/2", "12"],
  ["8", "10"],
  ["6", "9"],
  ["10 1/4", "8'4\""],
  ["7 1/2", "10"],
  ["6 3/4", "11"],
  ["8 1/2", "10"],
];

/** 8 1/4 in by 1 in, as the first of them is: rift, the tree's centre below and to the left. */
const end = { widthMm: 209.55, thicknessMm: 25.4 };
const pith = { xMm: -90, yMm: 215 };

test.setTimeout(150_000);

test("a delivery becomes tagged, photographed boards that a maker finds at the rack and reserves", async ({
  page,
  browser,
}) => {
  const began = Date.now();
  await signIn(page, tomasz);

  await test.step("log a delivery of twelve boards", async () => {
    await page.goto("/deliveries/new");
    await page.getByLabel("New supplier").fill("Copper Beech Timber");
    await page.getByLabel("Supplier's reference").fill("CB-204");
    await page.getByLabel("Species").selectOption({ label: "Oak, white" });
    await page.getByLabel("Claimed volume").fill("78");
    await page.getByLabel("Price").fill("9.40");
    await page.getByRole("button", { name: "Log it and tally" }).click();
    await expect(page.getByLabel("Width, row 1", { exact: true })).toBeFocused();
    for (const [width, length] of tally) {
      await page.keyboard.type(width);
      await page.keyboard.press("Enter");
      await page.keyboard.type(length);
      await page.keyboard.press("Enter");
    }
    await page.reload();
    await expect(page.getByRole("button", { name: "Save 12 boards" })).toBeVisible();
    await page.getByRole("button", { name: "Save 12 boards" }).click();
    await expect(page).toHaveURL(/\/deliveries\/[0-9a-z]{13}\?tallied/);
  });
  expect(Date.now() - began).toBeLessThan(180_000);

  await page
    .getByRole("link", { name: /^end grain: not read yet.*WO-\d+/ })
    .first()
    .click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(/^WO-\d{4}$/);
  const boardUrl = page.url();
  const tag = (await page.getByRole("heading", { level: 1 }).textContent()) ?? "";

  await test.step("photograph its near end and mark the rings", async () => {
    const picture = await endPicture(end, pith);
    await page
      .getByLabel("Choose a file")
      .setInputFiles({ name: "end.jpg", mimeType: "image/jpeg", buffer: picture.jpeg });
    await expect(page.getByRole("heading", { name: `Rings of ${tag}` })).toBeVisible();
    await markRings(page, picture);
    await page.getByRole("button", { name: "Keep this reading" }).click();
    await expect(page).toHaveURL(boardUrl);
    await expect(page.getByRole("img", { name: /^end grain: rift, \d+° to \d+°$/ }).first()).toBeVisible();
  });

  const address = await test.step("print its tag and read the code off the paper", async () => {
    await page.getByRole("link", { name: "Print the tag" }).click();
    const made = page.waitForEvent("popup");
    const pdf = page.context().waitForEvent("response", (response) => response.url().includes("/files/tags.pdf"));
    await page.getByRole("button", { name: "Make the PDF" }).click();
    const url = (await pdf).url();
    await (await made).close();
    const answer = await page.request.get(url);
    expect(answer.headers()["content-type"]).toBe("application/pdf");
    const codes = await codesOnFirstPage(await answer.body());
    expect(codes).toEqual([boardUrl]);
    return codes[0] as string;
  });

  await test.step("scan it with a phone, sign in, and reserve half of it", async () => {
    const phone = await (await browser.newContext({ ...devices["Pixel 7"] })).newPage();
    await signIn(phone, tomasz, new URL(address).pathname);
    await expect(phone.getByRole("heading", { level: 1 })).toHaveText(tag);
    await reserveHalf(phone, "Chapel stools");
    await expect(phone).toHaveURL(address);
    await expect(phone.getByText("60 in reserved")).toBeVisible();
    await phone.context().close();
  });

  await test.step("somebody else is refused the same half, and told what else would do", async () => {
    const other = await (await browser.newContext({ ...devices["Pixel 7"] })).newPage();
    await signIn(other, priya, new URL(address).pathname);
    await reserveHalf(other, "Hall bench");
    const refusal = other.getByRole("alert");
    await expect(refusal).toContainText("That length is spoken for");
    await expect(refusal).toContainText("Tomasz Brandt");
    await expect(refusal).toContainText("Chapel stools");
    await expect(refusal).toContainText(/until \d+ \w+ \d{4}/);
    await expect(refusal).toContainText("Still free: 60 to 120 in");
    await expect(refusal).toContainText("Would do as well");
    await expect(other.getByLabel("Length", { exact: true })).toHaveValue("60");
    await other.context().close();
  });
});

async function reserveHalf(page: Page, project: string): Promise<void> {
  await page.getByRole("link", { name: "Reserve for a project" }).click();
  await page.getByLabel("For which project").selectOption({ label: project });
  await page.getByLabel("A length from the near end").check();
  await page.getByLabel("Length", { exact: true }).fill("60");
  await page.getByRole("button", { name: "Reserve", exact: true }).click();
}

/** Drags the corners to the board's own and draws along three rings. */
async function markRings(page: Page, picture: EndPicture): Promise<void> {
  const photo = page.getByRole("group", { name: /mark its corners and rings/ });
  await expect(photo.getByRole("slider")).toHaveCount(4);
  for (const [i, corner] of picture.corners.entries()) {
    const handle = photo.getByRole("slider").nth(i);
    const box = await handle.boundingBox();
    if (!box) throw new Error("a corner is not on the screen");
    await page.mouse.move(box.x + box.width / 2, box.y + box.height / 2);
    await drag(page, photo, picture, [corner]);
  }
  for (const share of [0.2, 0.5, 0.8]) {
    const start = { xMm: end.widthMm * share, yMm: end.thicknessMm / 2 };
    const line = Array.from({ length: 9 }, (_, i) => picture.alongRing(start, -10 + i * 2.5));
    await moveTo(page, photo, picture, line[0] as { x: number; y: number });
    await drag(page, photo, picture, line.slice(1));
  }
}

async function moveTo(page: Page, photo: Locator, picture: EndPicture, to: { x: number; y: number }): Promise<void> {
  const box = await photo.boundingBox();
  if (!box) throw new Error("the photo is not on the screen");
  await page.mouse.move(box.x + (to.x / picture.widthPx) * box.width, box.y + (to.y / picture.heightPx) * box.height, {
    steps: 3,
  });
}

async function drag(page: Page, photo: Locator, picture: EndPicture, path: { x: number; y: number }[]): Promise<void> {
  await page.mouse.down();
  for (const point of path) await moveTo(page, photo, picture, point);
  await page.mouse.up();
}
