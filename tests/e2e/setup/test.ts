import { randomInt } from "node:crypto";
import { test as playwright } from "@playwright/test";

export { expect } from "@playwright/test";

/** Playwright's test, asking from an address of its own, as limits on tries count by address. */
export const test = playwright.extend({
  extraHTTPHeaders: async ({ isMobile }, use) => {
    // 10.0.0.0/8 is private (RFC 1918).
    await use({ "X-Forwarded-For": `10.${isMobile ? 1 : 0}.${randomInt(256)}.${randomInt(256)}` });
  },
});
