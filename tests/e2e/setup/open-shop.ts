import { rm } from "node:fs/promises";
import { endProcess, spawnTied } from "#scripts/child-process.ts";
import { untilItAnswers } from "#scripts/web-process.ts";
import { chosenShop } from "./chosen-shop.ts";

/** Of the caller's settings none may lead to real services. */
const noServices = {
  DATABASE_URL: "",
  S3_ENDPOINT: "",
  SMTP_URL: "",
  SMTP_HOST: "",
  PUBLIC_URL: "",
  SESSION_SECRETS: "",
};

/** Before the first browser test: the shop as scripts/start.sh opens it, demonstration too, on data of its own. Two processes answer, as people must be able to meet across them. */
export default async function openShop(): Promise<() => Promise<void>> {
  const { port, folder } = chosenShop();
  const settings = {
    ...noServices,
    PORT: String(port),
    HOST: "127.0.0.1",
    DATA_FOLDER: folder,
    WEB_PROCESSES: "2",
    // Each test says that it comes from an address of its own (see test.ts), or they would use up each other's tries.
    TRUST_PROXY: "1",
  };
  const shop = spawnTied(process.execPath, ["--import", "tsx", "scripts/start.ts"], {
    env: { ...process.env, ...settings },
    show: true,
  });
  const close = async () => {
    await endProcess(shop);
    await rm(folder, { recursive: true, force: true });
  };
  try {
    await untilItAnswers(shop, { HOST: "127.0.0.1", PORT: port });
  } catch (error) {
    await close();
    throw error;
  }
  return close;
}
