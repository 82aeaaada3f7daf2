import { execFile } from "node:child_process";
import { existsSync } from "node:fs";
import { mkdir, readFile, rename, rm } from "node:fs/promises";
import path from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { promisify } from "node:util";
import { createConnection } from "mysql2/promise";
import { endProcess, spawnTied } from "./child-process.ts";
import { freePort } from "./free-port.ts";
import { WantedError } from "./run-script.ts";

export interface MariadbServer {
  /** The address of a database on this server. */
  url(database: string): string;
  stop(): Promise<void>;
}

export interface PrivateMariadbOptions {
  /** Where its data is kept; made when it is not there. */
  folder: string;
  /** For tests: does not wait for the disk, so data may be lost when the machine stops. */
  forgetful?: boolean;
}

/**
 * Starts a MariaDB of our own from Debian's package on a free loopback port, as root or as an ordinary user, and creates its system tables the first time.
 * It ends with this process, however that ends. Anybody on this machine can reach it: it is for demonstration, development and tests.
 *
 * @throws WantedError when MariaDB is not installed, its folder is in use, or it does not start.
 */
export async function startPrivateMariadb({
  folder,
  forgetful = false,
}: PrivateMariadbOptions): Promise<MariadbServer> {
  const dataFolder = path.resolve(folder);
  const program = findProgram("mariadbd");
  const pidFile = path.join(dataFolder, "mariadbd.pid");
  await untilNobodyUses(dataFolder, pidFile);
  if (!existsSync(dataFolder)) await installTables(dataFolder);

  const port = await freePort();
  const server = spawnTied(program, [
    "--no-defaults",
    `--datadir=${dataFolder}`,
    // Within its data folder, where it works: a whole path may be longer than the 107 characters that a socket's may have.
    "--socket=mariadbd.sock",
    `--port=${port}`,
    "--bind-address=127.0.0.1",
    `--pid-file=${pidFile}`,
    `--log-error=${path.join(dataFolder, "mariadbd.log")}`,
    "--skip-name-resolve",
    "--character-set-server=utf8mb4",
    "--default-time-zone=+00:00",
    "--max-connections=300",
    ...(asRoot() ? ["--user=root"] : []),
    ...(forgetful
      ? ["--innodb-flush-log-at-trx-commit=0", "--innodb-doublewrite=0", "--innodb-flush-method=nosync"]
      : []),
  ]);
  const stop = () => endProcess(server);
  try {
    await untilItAnswers(port, () => server.exitCode === null && server.signalCode === null);
  } catch (error) {
    await stop();
    throw new WantedError(`MariaDB did not start (${await lastErrorLine(dataFolder)}).`, { cause: error });
  }
  return { url: (database) => `mysql://root@127.0.0.1:${port}/${database}`, stop };
}

/** Where a program of Debian's MariaDB is. An ordinary user's PATH lacks /usr/sbin. */
function findProgram(name: string): string {
  const folders = [...(process.env.PATH ?? "").split(":"), "/usr/sbin", "/usr/local/sbin"];
  const found = folders.map((folder) => path.join(folder, name)).find((file) => existsSync(file));
  if (!found) throw new WantedError("MariaDB is not installed: apt-get install mariadb-server");
  return found;
}

/** Makes the system tables beside the folder and moves them there whole, so that nobody finds them half made. */
async function installTables(dataFolder: string): Promise<void> {
  const unfinished = `${dataFolder}.unfinished`;
  await rm(unfinished, { recursive: true, force: true });
  await mkdir(unfinished, { recursive: true });
  await promisify(execFile)(findProgram("mariadb-install-db"), [
    "--no-defaults",
    `--datadir=${unfinished}`,
    "--auth-root-authentication-method=normal",
    "--skip-test-db",
    ...(asRoot() ? ["--user=root"] : []),
  ]);
  await rename(unfinished, dataFolder);
}

/** A server whose starter was killed may need a moment to end. One that stays belongs to somebody. */
async function untilNobodyUses(dataFolder: string, pidFile: string): Promise<void> {
  const pid = Number(await readFile(pidFile, "utf8").catch(() => ""));
  const isInUse = async () => {
    // The number may have gone to another program since.
    const command = await readFile(`/proc/${pid}/cmdline`, "utf8").catch(() => "");
    return command.includes(`--datadir=${dataFolder}\0`);
  };
  for (let waitedMs = 0; await isInUse(); waitedMs += 100) {
    if (waitedMs > 5_000)
      throw new WantedError(
        `The data in ${dataFolder} is in use by another start (database process ${pid}): stop that first.`,
      );
    await sleep(100);
  }
}

async function untilItAnswers(port: number, isAlive: () => boolean): Promise<void> {
  const deadline = Date.now() + 60_000;
  while (isAlive()) {
    try {
      const connection = await createConnection({ host: "127.0.0.1", port, user: "root" });
      return await connection.end();
    } catch (error) {
      if (Date.now() > deadline) throw error;
      await sleep(50);
    }
  }
  throw new Error("it ended at once");
}

async function lastErrorLine(dataFolder: string): Promise<string> {
  const lines = (await readFile(path.join(dataFolder, "mariadbd.log"), "utf8").catch(() => "")).split("\n");
  return lines.findLast((line) => line.includes("[ERROR]"))?.replace(/^.*\[ERROR\]\s*/, "") ?? "no reason given";
}

function asRoot(): boolean {
  return process.getuid?.() === 0;
}
