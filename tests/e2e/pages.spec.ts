import AxeBuilder from "@axe-core/playwright";
import type { ConsoleMessage, Page } from "@playwright/test";
import { signIn } from "./setup/sign-in.ts";
import { expect, test } from "./setup/test.ts";

const ines = "ines@millrace.example";

/** Pages of a stranger. */
const doors = ["/sign-in", "/sign-in/link?t=old", "/invitation/old", "/no-such-page"];

/** Every page of a shop that has no record in its address. */
const pages = [
  "/rack",
  "/rack?rings=rift",
  "/rack/bays/new",
  "/boards",
  "/boards?species=white-oak&rings=rift&length=96",
  "/boards?q=nothingatall",
  "/deliveries",
  "/deliveries/new",
  "/suppliers",
  "/suppliers/new",
  "/projects",
  "/projects/new",
  "/scan",
  "/settings",
  "/people",
  "/account",
  "/shops",
  "/shops/new",
  "/calculators",
];

test.setTimeout(180_000);

test("a stranger's pages are sound and can be used by everybody", async ({ page }) => {
  for (const path of doors) await judge(page, path);
});

test("every page of a shop is sound and can be used by everybody, in a lit shop and a dim one", async ({ page }) => {
  await signIn(page, ines);
  const found = await recordPages(page);
  for (const path of [...pages, ...found]) await judge(page, path);
  await page.emulateMedia({ colorScheme: "dark" });
  for (const path of ["/rack", "/boards", "/deliveries", "/projects", "/settings", ...found.slice(0, 3)])
    await judge(page, path);
});

/** Pages of records, found as a person would find them: by following links. */
async function recordPages(page: Page): Promise<string[]> {
  const board = await firstLink(page, "/boards?species=white-oak&state=any", /^\/boards\/[0-9a-z]{13}$/);
  const held = await firstLink(page, "/boards?free=&species=black-walnut&sort=length", /^\/boards\/[0-9a-z]{13}$/);
  const project = await firstLink(page, "/projects", /^\/projects\/[0-9a-z]{13}$/);
  const delivery = await firstLink(page, "/deliveries", /^\/deliveries\/[0-9a-z]{13}$/);
  const calculators = await links(page, "/calculators", /^\/calculators\/[a-z-]+/);
  const marking = await links(page, board, /\/rings\/[0-9a-z]{13}$/);
  return [
    board,
    held,
    project,
    delivery,
    ...marking.slice(0, 1),
    ...[
      "correct/size",
      "correct/figure",
      "moisture",
      "move",
      "mark",
      "defects",
      "reserve",
      "delete",
      "rings/by-eye",
    ].map((tail) => `${board}/${tail}`),
    `${project}/change`,
    `${project}/plan`,
    `${project}/take-down`,
    `${project}/parts`,
    `${delivery}/edit`,
    `/tags?board=${board.split("/").at(-1)}`,
    ...calculators,
  ];
}

async function links(page: Page, from: string, pattern: RegExp): Promise<string[]> {
  await page.goto(from);
  const hrefs = await page
    .locator("main a[href]")
    .evaluateAll((all) => all.map((link) => link.getAttribute("href") ?? ""));
  return [...new Set(hrefs)].filter((href) => pattern.test(href));
}

async function firstLink(page: Page, from: string, pattern: RegExp): Promise<string> {
  const [first] = await links(page, from, pattern);
  if (!first) throw new Error(`no link like ${pattern} on ${from}`);
  return first;
}

/** Opens a page: no script fails, nothing runs off its side, its title is set, and axe finds nothing against WCAG 2.2 AA. */
async function judge(page: Page, path: string): Promise<void> {
  await test.step(path, async () => {
    const faults: string[] = [];
    const onError = (error: Error) => faults.push(error.message);
    page.on("pageerror", onError);
    const onConsole = (message: ConsoleMessage) => {
      if (message.type() === "error" && /Content Security Policy/.test(message.text())) faults.push(message.text());
    };
    page.on("console", onConsole);
    await page.goto(path, { waitUntil: "load" });
    await expect(page, path).toHaveTitle(/ · Rayfleck$/);
    await expect(page.locator("h1"), path).toHaveCount(1);
    const { violations } = await new AxeBuilder({ page })
      .withTags(["wcag2a", "wcag2aa", "wcag21a", "wcag21aa", "wcag22aa"])
      .analyze();
    const found = violations.map(
      ({ id, nodes }) =>
        `${id}: ${nodes
          .map((node) => node.target.join(" "))
          .slice(0, 3)
          .join(", ")}`,
    );
    expect.soft(found, path).toEqual([]);
    const overrun = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
    expect.soft(overrun, `${path} runs off the side`).toBeLessThanOrEqual(0);
    page.off("pageerror", onError);
    page.off("console", onConsole);
    expect.soft(faults, path).toEqual([]);
  });
}
