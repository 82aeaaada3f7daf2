import { defineConfig, devices } from "@playwright/test";
import { chooseShop } from "./setup/chosen-shop.ts";

const shop = await chooseShop();

const launchOptions = {
  // Debian's own; nothing is downloaded.
  executablePath: "/usr/bin/chromium",
  args: [
    "--no-sandbox",
    "--disable-gpu",
    "--disable-background-networking",
    "--disable-component-update",
    "--disable-sync",
    "--use-fake-device-for-media-stream",
    "--use-fake-ui-for-media-stream",
  ],
};

/** Browser tests, on the production build with a real MariaDB and the fakes. A spec runs on both screens unless its name says which: *.desk.spec.ts, *.phone.spec.ts. */
export default defineConfig({
  testDir: ".",
  outputDir: "../../test-results",
  globalSetup: "./setup/open-shop.ts",
  forbidOnly: true,
  workers: 2,
  timeout: 45_000,
  expect: { timeout: 10_000 },
  reporter: [["list"]],
  use: { baseURL: shop.url, launchOptions, trace: "retain-on-failure" },
  projects: [
    {
      name: "desk",
      testIgnore: "**/*.phone.spec.ts",
      use: { ...devices["Desktop Chrome"], viewport: { width: 1280, height: 900 }, launchOptions },
    },
    { name: "phone", testIgnore: "**/*.desk.spec.ts", use: { ...devices["Pixel 7"], launchOptions } },
  ],
});
