import { execFile } from "node:child_process";
import { createServer } from "node:net";
import { promisify } from "node:util";
import { expect, it } from "vitest";

/** Starts the shop with settings that must keep it from starting. */
async function start(settings: Record<string, string>) {
  const command = promisify(execFile)(process.execPath, ["--import", "tsx", "scripts/start.ts"], {
    env: { PATH: process.env.PATH, ...settings },
    timeout: 20_000,
  });
  return command.then(
    () => ({ told: "", code: 0 }),
    (error: { stderr: string; code: number }) => ({ told: error.stderr, code: error.code }),
  );
}

it("tells in one line that the port is in use", async () => {
  const other = createServer();
  const port = await new Promise<number>((resolve) => {
    other.listen(0, "127.0.0.1", () => resolve((other.address() as { port: number }).port));
  });
  expect(await start({ PORT: String(port) })).toEqual({
    told: `Port ${port} is in use: choose another with PORT.\n`,
    code: 1,
  });
  other.close();
}, 20_000);

it("tells in one line each which settings are missing for services that were named", async () => {
  const { told, code } = await start({
    DATABASE_URL: "mysql://shop@db.example/rayfleck",
    S3_ENDPOINT: "https://s3.example",
    PORT: "0",
  });
  expect(code).toBe(1);
  expect(told.trimEnd().split("\n")).toEqual([
    "Some settings are missing or wrong:",
    expect.stringMatching(/^ {2}PORT is wrong: /),
    "  SESSION_SECRETS is not set",
    "  S3_BUCKET is not set",
    "  S3_ACCESS_KEY_ID is not set",
    "  S3_SECRET_ACCESS_KEY is not set",
  ]);
}, 20_000);
