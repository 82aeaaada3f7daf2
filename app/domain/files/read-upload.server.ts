import { FileTooLargeError, type Storage } from "#app/services/storage.server.ts";

/** Reads what somebody sent to the file store, which may not be what they announced, nor have come at all. */
export async function readUpload(
  storage: Storage,
  key: string,
  mostBytes: number,
): Promise<{ ok: true; bytes: Uint8Array } | { ok: false; why: "not arrived" | "too large" }> {
  const head = await storage.head(key);
  if (!head) return { ok: false, why: "not arrived" };
  if (head.bytes > mostBytes) return { ok: false, why: "too large" };
  try {
    const bytes = await storage.read(key, mostBytes);
    return bytes ? { ok: true, bytes } : { ok: false, why: "not arrived" };
  } catch (error) {
    if (error instanceof FileTooLargeError) return { ok: false, why: "too large" };
    throw error;
  }
}
