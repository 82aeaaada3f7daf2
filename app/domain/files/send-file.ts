import { z } from "zod";

const begun = z.object({
  id: z.string(),
  put: z.object({ url: z.url(), headers: z.record(z.string(), z.string()) }),
});
type Put = z.infer<typeof begun>["put"];

const confirmed = z.union([z.object({ ok: z.literal(true) }), z.object({ ok: z.literal(false), why: z.string() })]);

export type FileSent = { ok: true; id: string } | { ok: false; why: "no answer" | "connection lost" | (string & {}) };

/** What to tell somebody whose file got nowhere; other reasons are the receiver's to put into words. */
export const sendingWords: Record<string, string> = {
  "no answer": "The shop's server did not answer. Check the connection and send it again.",
  "connection lost": "The connection was lost. Send it again.",
};

/** Whether the very same file can succeed at a second try: it got lost on the way, and was not found wanting. */
export function isWorthSendingAgain(why: string): boolean {
  return why in sendingWords || why === "not arrived";
}

const tries = 3;

interface Sending {
  /** Announces the file; answers with an id and the address to PUT it to. */
  begin: { address: string; body: Record<string, unknown> };
  /** Says that it was sent; answers whether it was taken in. */
  confirmAddress: (id: string) => string;
  /** Share of the file sent, 0 to 1. */
  onProgress: (share: number) => void;
}

/** Sends a file from the browser: announce, PUT straight to the file store, confirm. A lost connection is tried again, from the start of the file. */
export async function sendFile(file: File, { begin, confirmAddress, onProgress }: Sending): Promise<FileSent> {
  const announced = await post(begin.address, begin.body);
  const answer = announced?.ok ? begun.safeParse(await announced.json().catch(() => null)) : null;
  if (!answer?.success) return { ok: false, why: "no answer" };
  const { id, put } = answer.data;
  if (!(await putWithRetry(put, file, onProgress))) return { ok: false, why: "connection lost" };
  const last = await post(confirmAddress(id), {});
  const result = confirmed.safeParse(await last?.json().catch(() => null));
  if (!result.success) return { ok: false, why: "no answer" };
  return result.data.ok ? { ok: true, id } : { ok: false, why: result.data.why };
}

async function post(address: string, body: unknown): Promise<Response | null> {
  try {
    return await fetch(address, {
      method: "POST",
      headers: { "Content-Type": "application/json" },
      body: JSON.stringify(body),
    });
  } catch {
    return null;
  }
}

async function putWithRetry(put: Put, file: File, onProgress: (share: number) => void): Promise<boolean> {
  for (let attempt = 1; attempt <= tries; attempt++) {
    if (await putOnce(put, file, onProgress)) return true;
    if (attempt < tries) await new Promise((resume) => setTimeout(resume, 500 * 3 ** attempt));
  }
  return false;
}

/** fetch cannot tell how much was sent; XMLHttpRequest can. */
function putOnce({ url, headers }: Put, file: File, onProgress: (share: number) => void): Promise<boolean> {
  return new Promise((resolve) => {
    const request = new XMLHttpRequest();
    request.open("PUT", url);
    for (const [name, value] of Object.entries(headers)) request.setRequestHeader(name, value);
    request.upload.onprogress = (event) => onProgress(event.lengthComputable ? event.loaded / event.total : 0);
    request.onload = () => resolve(request.status >= 200 && request.status < 300);
    request.onerror = () => resolve(false);
    request.send(file);
  });
}
