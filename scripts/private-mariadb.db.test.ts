import { spawn } from "node:child_process";
import { existsSync } from "node:fs";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { setTimeout as sleep } from "node:timers/promises";
import { createConnection } from "mysql2/promise";
import { afterAll, beforeAll, expect, it } from "vitest";
import { startPrivateMariadb } from "./private-mariadb.ts";

let folder: string;

beforeAll(async () => {
  folder = path.join(await mkdtemp(path.join(tmpdir(), "rayfleck-private-")), "mariadb");
});
afterAll(() => rm(path.dirname(folder), { recursive: true }));

async function query(url: string, sql: string) {
  const connection = await createConnection(url);
  const [rows] = await connection.query(sql);
  await connection.end();
  return rows;
}

it("keeps its data from one start to the next", async () => {
  const first = await startPrivateMariadb({ folder });
  await query(first.url(""), "CREATE DATABASE kept");
  await query(first.url("kept"), "CREATE TABLE boards (tag INT)");
  await query(first.url("kept"), "INSERT INTO boards VALUES (41)");
  await first.stop();
  const second = await startPrivateMariadb({ folder });
  expect(await query(second.url("kept"), "SELECT tag FROM boards")).toEqual([{ tag: 41 }]);
  await second.stop();
});

it("does not share a folder that is in use, and says by whom", async () => {
  const server = await startPrivateMariadb({ folder });
  const pid = (await readFile(path.join(folder, "mariadbd.pid"), "utf8")).trim();
  await expect(startPrivateMariadb({ folder })).rejects.toThrow(
    `in use by another start (database process ${pid}): stop that first.`,
  );
  await server.stop();
}, 30_000);

it("ends with the process that started it, even when that is killed", async () => {
  const script = `import { startPrivateMariadb } from "./scripts/private-mariadb.ts";
    await startPrivateMariadb({ folder: ${JSON.stringify(folder)} }); console.log("up"); setInterval(() => {}, 1000);`;
  const starter = spawn(process.execPath, ["--import", "tsx", "--input-type=module", "-e", script], {
    stdio: ["ignore", "pipe", "inherit"],
  });
  await new Promise((resolve) => starter.stdout.once("data", resolve));
  const pid = (await readFile(path.join(folder, "mariadbd.pid"), "utf8")).trim();
  starter.kill("SIGKILL");
  for (
    let waitedMs = 0;
    existsSync(`/proc/${pid}/cmdline`) && (await readFile(`/proc/${pid}/cmdline`, "utf8")) && waitedMs < 20_000;
    waitedMs += 100
  )
    await sleep(100);
  expect(existsSync(path.join(folder, "mariadbd.pid"))).toBe(false);
}, 40_000);
