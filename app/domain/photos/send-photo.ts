import { href } from "react-router";
import { z } from "zod";
import { mostPhotoBytes, type PhotoKind, type PhotoRefusal, refusalWords } from "./photo.ts";

const begun = z.object({
  photoId: z.string(),
  put: z.object({ url: z.url(), headers: z.record(z.string(), z.string()) }),
});
const confirmed = z.union([
  z.object({ ok: z.literal(true), photoId: z.string() }),
  z.object({ ok: z.literal(false), why: z.string() }),
]);

export type Sent = { ok: true; photoId: string } | { ok: false; words: string };

const tries = 3;

/**
 * Sends a photo from the browser: announce, PUT straight to the file store, confirm. A lost connection is tried again, from the start of the file.
 *
 * @param onProgress share of the file sent, 0 to 1.
 */
export async function sendPhoto(
  file: File,
  photo: { boardId: string; kind: PhotoKind },
  onProgress: (share: number) => void,
): Promise<Sent> {
  if (file.size > mostPhotoBytes) return refused("too large");
  const contentType = file.type.startsWith("image/") ? file.type : "image/jpeg";
  const answer = await post(href("/api/boards/:boardId/photos", { boardId: photo.boardId }), {
    kind: photo.kind,
    bytes: file.size,
    contentType,
  });
  if (!answer?.ok)
    return { ok: false, words: "The shop's server did not answer. Check the connection and send it again." };
  const { photoId, put } = begun.parse(await answer.json());
  if (!(await putWithRetry(put, file, onProgress)))
    return { ok: false, words: "The connection was lost. Send it again." };
  const last = await post(href("/api/photos/:photoId/confirm", { photoId }), {});
  const result = confirmed.safeParse(await last?.json().catch(() => null));
  if (!result.success) return { ok: false, words: "The shop's server did not answer. Send it again." };
  return result.data.ok ? { ok: true, photoId } : refused(result.data.why as PhotoRefusal);
}

function refused(why: PhotoRefusal): Sent {
  return { ok: false, words: refusalWords(why) };
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

async function putWithRetry(
  put: z.infer<typeof begun>["put"],
  file: File,
  onProgress: (share: number) => void,
): Promise<boolean> {
  for (let attempt = 1; attempt <= tries; attempt++) {
    if (await putOnce(put, file, onProgress)) return true;
    if (attempt < tries) await new Promise((resume) => setTimeout(resume, 500 * 3 ** attempt));
  }
  return false;
}

/** fetch cannot tell how much was sent; XMLHttpRequest can. */
function putOnce(
  { url, headers }: z.infer<typeof begun>["put"],
  file: File,
  onProgress: (share: number) => void,
): Promise<boolean> {
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
