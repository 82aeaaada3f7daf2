import { mkdtemp, readdir, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { createStorage, type Storage } from "#app/services/storage.server.ts";
import { startFakeS3 } from "#scripts/fakes/s3.ts";

export interface TestStorage {
  storage: Storage;
  /** How many files are kept in it now. */
  count(): Promise<number>;
  stop(): Promise<void>;
}

/** An empty file store over the real protocol, for one test file. */
export async function startTestStorage(): Promise<TestStorage> {
  const folder = await mkdtemp(path.join(tmpdir(), "rayfleck-s3-"));
  const fake = await startFakeS3({ folder, port: 0, origins: ["http://rack.example"] });
  const storage = createStorage({
    ...fake.settings,
    S3_PUBLIC_ENDPOINT: fake.settings.S3_ENDPOINT,
    S3_REGION: "us-east-1",
    S3_FORCE_PATH_STYLE: true,
  });
  return {
    storage,
    async count() {
      const files = await readdir(folder, { recursive: true });
      return files.filter((file) => file.endsWith("_object")).length;
    },
    async stop() {
      storage.close();
      await fake.stop();
      await rm(folder, { recursive: true });
    },
  };
}

/** What a browser does with the address it was given. */
export async function sendTo(put: { url: string; headers: Record<string, string> }, bytes: Uint8Array): Promise<void> {
  const answer = await fetch(put.url, { method: "PUT", headers: put.headers, body: Buffer.from(bytes) });
  if (!answer.ok) throw new Error(`the file store answered ${answer.status}`);
}
