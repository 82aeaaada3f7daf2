import { mkdir, mkdtemp, rm, writeFile } from "node:fs/promises";
import type { AddressInfo } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";
import { clientAddress } from "#app/services/client-address.server.ts";
import { createWebServer } from "./web-server.ts";

let clientFolder: string;

beforeAll(async () => {
  clientFolder = await mkdtemp(path.join(tmpdir(), "rayfleck-client-"));
  await mkdir(path.join(clientFolder, "assets"));
  await writeFile(path.join(clientFolder, "assets", "app-1a2b.js"), "export {}");
  await writeFile(path.join(clientFolder, "icon.svg"), "<svg/>");
});
afterAll(() => rm(clientFolder, { recursive: true }));

/** Asks a server that answers everything else with the address it believes the request came from. */
async function ask(address: string, headers: Record<string, string> = {}, trustProxy = 0) {
  const app = createWebServer({
    clientFolder,
    trustProxy,
    handler: (request, response) => {
      const asApp = new Request("http://shop.example/", { headers: request.headers as Record<string, string> });
      response.send(`${clientAddress(asApp)} ${request.protocol}`);
    },
  });
  const server = app.listen(0, "127.0.0.1");
  try {
    await new Promise((resolve) => server.once("listening", resolve));
    const response = await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}${address}`, { headers });
    return { status: response.status, headers: response.headers, text: await response.text() };
  } finally {
    server.closeAllConnections();
    server.close();
  }
}

it("tells the app who asks", async () => {
  expect((await ask("/boards")).text).toBe("127.0.0.1 http");
});

it("believes nobody who says it himself", async () => {
  const forged = { "X-Client-Address": "6.6.6.6", "X-Forwarded-For": "6.6.6.6", "X-Forwarded-Proto": "https" };
  expect((await ask("/boards", forged)).text).toBe("127.0.0.1 http");
});

it("believes as many proxies as it was told of, and what stands before them not", async () => {
  const headers = { "X-Forwarded-For": "6.6.6.6, 198.51.100.7", "X-Forwarded-Proto": "https" };
  expect((await ask("/boards", headers, 1)).text).toBe("198.51.100.7 https");
});

it("lets browsers keep hashed files for ever, and others for a while", async () => {
  expect((await ask("/assets/app-1a2b.js")).headers.get("Cache-Control")).toBe("public, max-age=31536000, immutable");
  expect((await ask("/icon.svg")).headers.get("Cache-Control")).toBe("public, max-age=3600");
  expect((await ask("/icon.svg")).headers.get("X-Content-Type-Options")).toBe("nosniff");
});

it("answers 404 for a file of an older build, without asking the app", async () => {
  expect((await ask("/assets/app-0000.js")).status).toBe(404);
});

it.each(["/../package.json", "/%2e%2e/package.json", "/assets/..%2f..%2fpackage.json"])(
  "gives out nothing beside the build: %s",
  async (address) => {
    expect((await ask(address)).text).not.toContain("rayfleck");
  },
);
