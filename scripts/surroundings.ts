import { randomBytes } from "node:crypto";
import { existsSync } from "node:fs";
import { mkdir, readFile, writeFile } from "node:fs/promises";
import path from "node:path";
import { type Env, parseEnv } from "#app/services/env.server.ts";
import { isPortFree, portNear } from "./free-port.ts";
import { startPrivateMariadb } from "./private-mariadb.ts";
import { WantedError } from "./run-script.ts";

/** What the app stands on: its settings, and whatever had to be started for it. */
export interface Surroundings {
  /** Complete: the given ones and those that lead to what was started. For the environment of the app's process. */
  settings: Record<string, string>;
  env: Env;
  /** The database is ours, in the folder: a demonstration may be loaded into it. */
  ownsDatabase: boolean;
  /** Where mail can be read, when it goes nowhere. */
  inboxUrl: string | null;
  stop(): Promise<void>;
}

type Given = Record<string, string | undefined>;
type Settings = Record<string, string>;

/** Services that are started when no setting names a real one, with stand-ins for the settings they will bring. */
const services = {
  database: {
    isGiven: (given: Given) => Boolean(given.DATABASE_URL),
    standIns: { DATABASE_URL: "mysql://root@127.0.0.1/rayfleck", SESSION_SECRETS: "-".repeat(32) },
  },
  files: {
    isGiven: (given: Given) => Boolean(given.S3_ENDPOINT),
    standIns: { S3_ENDPOINT: "http://127.0.0.1", S3_BUCKET: "-", S3_ACCESS_KEY_ID: "-", S3_SECRET_ACCESS_KEY: "-" },
  },
  mail: {
    isGiven: (given: Given) => Boolean(given.SMTP_URL || given.SMTP_HOST),
    standIns: { SMTP_URL: "smtp://127.0.0.1", MAIL_FROM: "Rayfleck <rack@shop.example>" },
  },
};

/**
 * Starts a private MariaDB, an S3 fake and a mail fake, with their data in DATA_FOLDER: each only where the settings name no real one.
 *
 * @param given settings, usually process.env.
 * @throws SettingsError or WantedError, before anything starts, when those that are given are wrong or incomplete, or the shop's port is taken.
 */
export async function startSurroundings(given: Given): Promise<Surroundings> {
  const missing = Object.entries(services).filter(([, service]) => !service.isGiven(given));
  const ours = new Set(missing.map(([name]) => name));
  const standIns: Settings = Object.assign({}, ...missing.map(([, service]) => service.standIns));
  const wanted = parseEnv({ ...standIns, ...definedOnly(given) });
  if (!(await isPortFree(wanted.PORT, wanted.HOST)))
    throw new WantedError(`Port ${wanted.PORT} is in use: choose another with PORT.`);

  const folder = wanted.DATA_FOLDER;
  // Letters with sign-in codes lie in it.
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const running: { stop(): Promise<void> }[] = [];
  const stop = async () => {
    await Promise.all(running.splice(0).map((one) => one.stop()));
  };
  let inboxUrl: string | null = null;

  async function database(): Promise<Settings> {
    const server = await startPrivateMariadb({ folder: path.join(folder, "mariadb") });
    running.push(server);
    return { SESSION_SECRETS: await sessionSecret(folder), DATABASE_URL: server.url("rayfleck") };
  }
  async function files(): Promise<Settings> {
    const { startFakeS3 } = await import("./fakes/s3.ts");
    const port = await portNear(wanted.PORT + 1, wanted.HOST);
    const fake = await startFakeS3({
      folder: path.join(folder, "files"),
      host: wanted.HOST,
      port,
      origins: origins(wanted),
    });
    running.push(fake);
    // A phone on the same network reaches the files by the name under which it reaches the shop.
    return { S3_PUBLIC_ENDPOINT: `http://${new URL(wanted.PUBLIC_URL).hostname}:${port}`, ...fake.settings };
  }
  async function mail(): Promise<Settings> {
    const { startFakeMail } = await import("./fakes/mail.ts");
    const fake = await startFakeMail({ folder: mailFolder(folder), inboxPort: await portNear(wanted.PORT + 2) });
    running.push(fake);
    inboxUrl = fake.inboxUrl;
    return { MAIL_FROM: wanted.MAIL_FROM, ...fake.settings };
  }

  const starting = Object.entries({ database, files, mail }).filter(([name]) => ours.has(name));
  const started = await Promise.allSettled(starting.map(([, start]) => start()));
  const failed = started.find((result) => result.status === "rejected");
  if (failed) {
    await stop();
    throw failed.reason;
  }
  const brought: Settings = Object.assign(
    {},
    ...started.map((result) => result.status === "fulfilled" && result.value),
  );
  const settings = { ...brought, ...definedOnly(given) };
  return { settings, env: parseEnv(settings), ownsDatabase: ours.has("database"), inboxUrl, stop };
}

/** Where the mail fake of this folder keeps its letters. */
export function mailFolder(folder: string): string {
  return path.join(folder, "mail");
}

/** Under which names a browser may have opened the shop. */
function origins({ PUBLIC_URL, PORT }: Env): string[] {
  return [...new Set([new URL(PUBLIC_URL).origin, `http://localhost:${PORT}`, `http://127.0.0.1:${PORT}`])];
}

/** Made once and kept, so that a second start signs nobody out. */
async function sessionSecret(folder: string): Promise<string> {
  const file = path.join(folder, "session-secret");
  if (!existsSync(file)) await writeFile(file, randomBytes(32).toString("hex"), { mode: 0o600 });
  return readFile(file, "utf8");
}

function definedOnly(given: Given): Settings {
  return Object.fromEntries(
    Object.entries(given).filter((entry): entry is [string, string] => Boolean(entry[1]?.trim())),
  );
}
