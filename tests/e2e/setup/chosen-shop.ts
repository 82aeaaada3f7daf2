import { mkdtemp } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { freePort } from "#scripts/free-port.ts";

/** Where the shop of this run is. */
export interface ChosenShop {
  url: string;
  port: number;
  /** Its data, the letters too. */
  folder: string;
}

/** Chooses a port and a folder once a run. Playwright reads its configuration in every worker; the environment tells them what was chosen. */
export async function chooseShop(): Promise<ChosenShop> {
  process.env.E2E_PORT ??= String(await freePort());
  process.env.E2E_FOLDER ??= await mkdtemp(path.join(tmpdir(), "rayfleck-e2e-"));
  return chosenShop();
}

/** What chooseShop chose. */
export function chosenShop(): ChosenShop {
  const { E2E_PORT, E2E_FOLDER } = process.env;
  if (!E2E_PORT || !E2E_FOLDER) throw new Error("Browser tests run through tests/e2e/playwright.config.ts");
  return { url: `http://localhost:${E2E_PORT}`, port: Number(E2E_PORT), folder: E2E_FOLDER };
}
