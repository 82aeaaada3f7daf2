import { mkdtemp, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, expect, it } from "vitest";
import { type FakeS3, startFakeS3 } from "#scripts/fakes/s3.ts";
import { freePort } from "#scripts/free-port.ts";
import { createStorage, FileTooLargeError, newStorageKey, type Storage } from "./storage.server.ts";

const origin = "http://localhost:4310";
let folder: string;
let fake: FakeS3;
let storage: Storage;

beforeAll(async () => {
  folder = await mkdtemp(path.join(tmpdir(), "rayfleck-s3-"));
  fake = await startFakeS3({ folder, port: await freePort(), origins: [origin] });
  storage = createStorage({
    ...fake.settings,
    S3_PUBLIC_ENDPOINT: fake.settings.S3_ENDPOINT,
    S3_REGION: "us-east-1",
    S3_FORCE_PATH_STYLE: true,
  });
});
afterAll(async () => {
  storage.close();
  await fake.stop();
  await rm(folder, { recursive: true });
});

const picture = Buffer.from("not really a picture");

it("keeps a file, gives it back whole or as a stream, and forgets it", async () => {
  const key = newStorageKey("photos", "png");
  await storage.put(key, picture, "image/png");
  expect(await storage.head(key)).toEqual({ bytes: picture.length, contentType: "image/png" });
  expect(Buffer.from((await storage.read(key, 100))!)).toEqual(picture);
  const file = (await storage.stream(key))!;
  expect(file).toMatchObject({ bytes: picture.length, contentType: "image/png" });
  expect(Buffer.from(await new Response(file.body).arrayBuffer())).toEqual(picture);
  await storage.delete(key);
  await storage.delete(key);
  expect(await storage.head(key)).toBeNull();
  expect(await storage.read(key, 100)).toBeNull();
  expect(await storage.stream(key)).toBeNull();
});

it("does not read more than it was told to", async () => {
  const key = newStorageKey("photos");
  await storage.put(key, picture, "image/png");
  await expect(storage.read(key, picture.length - 1)).rejects.toThrow(FileTooLargeError);
  expect(await storage.read(key, picture.length)).toHaveLength(picture.length);
});

it("lets a browser of the shop send a file by itself", async () => {
  const key = newStorageKey("photos");
  const { url, headers } = await storage.presignPut(key, { bytes: picture.length, contentType: "image/jpeg" });
  const asked = await fetch(url, {
    method: "OPTIONS",
    headers: {
      Origin: origin,
      "Access-Control-Request-Method": "PUT",
      "Access-Control-Request-Headers": "content-type",
    },
  });
  expect(asked.ok).toBe(true);
  const sent = await fetch(url, { method: "PUT", body: picture, headers: { ...headers, Origin: origin } });
  expect(sent.status).toBe(200);
  expect(sent.headers.get("Access-Control-Allow-Origin")).toBe(origin);
  expect(await storage.head(key)).toEqual({ bytes: picture.length, contentType: "image/jpeg" });
});

it("does not let a page of somebody else's", async () => {
  const { url } = await storage.presignPut(newStorageKey("photos"), { bytes: 1, contentType: "image/jpeg" });
  const headers = { Origin: "http://evil.example", "Access-Control-Request-Method": "PUT" };
  expect((await fetch(url, { method: "OPTIONS", headers })).status).toBe(403);
});

it("signs type and size into the address, on the endpoint that the browser reaches", async () => {
  const behindProxy = createStorage({
    ...fake.settings,
    S3_PUBLIC_ENDPOINT: "https://files.example.org",
    S3_REGION: "eu-west-1",
    S3_FORCE_PATH_STYLE: true,
  });
  const { url } = await behindProxy.presignPut("photos/a", { bytes: 7, contentType: "image/webp" }, 60);
  const address = new URL(url);
  expect(address.origin).toBe("https://files.example.org");
  expect(address.searchParams.get("X-Amz-SignedHeaders")).toBe("content-length;content-type;host");
  expect(address.searchParams.get("X-Amz-Expires")).toBe("60");
  expect([...address.searchParams.keys()].filter((name) => name.includes("checksum"))).toEqual([]);
  behindProxy.close();
});

it("makes keys that cannot be guessed", () => {
  expect(newStorageKey("photos", "jpg")).toMatch(/^photos\/[0-9a-f]{40}\.jpg$/);
  expect(newStorageKey("photos")).not.toBe(newStorageKey("photos"));
});
