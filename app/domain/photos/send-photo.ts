import { href } from "react-router";
import { isWorthSendingAgain, sendFile, sendingWords } from "#app/domain/files/send-file.ts";
import { mostPhotoBytes, type PhotoKind, type PhotoRefusal, refusalWords } from "./photo.ts";

export type Sent = { ok: true; photoId: string } | { ok: false; words: string; isWorthAgain: boolean };

/**
 * Sends a photo from the browser straight to the file store.
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
  const sent = await sendFile(file, {
    begin: {
      address: href("/api/boards/:boardId/photos", { boardId: photo.boardId }),
      body: { kind: photo.kind, bytes: file.size, contentType },
    },
    confirmAddress: (photoId) => href("/api/photos/:photoId/confirm", { photoId }),
    onProgress,
  });
  return sent.ok ? { ok: true, photoId: sent.id } : refused(sent.why as PhotoRefusal);
}

function refused(why: PhotoRefusal): Sent {
  return { ok: false, words: sendingWords[why] ?? refusalWords(why), isWorthAgain: isWorthSendingAgain(why) };
}
