import { href } from "react-router";
import { isWorthSendingAgain, sendFile, sendingWords } from "#app/domain/files/send-file.ts";
import { type DocumentRefusal, documentRefusalWords, documentTypes, mostDocumentBytes } from "./document.ts";

/** What to tell somebody whose paper was not taken in, and whether the same file can succeed at a second try. */
export interface PaperRefused {
  words: string;
  isWorthAgain: boolean;
}

/**
 * Sends a paper of a delivery from the browser straight to the file store.
 *
 * @param onProgress share of the file sent, 0 to 1.
 * @returns null when it was taken in.
 */
export async function sendDocument(
  file: File,
  deliveryId: string,
  onProgress: (share: number) => void,
): Promise<PaperRefused | null> {
  if (file.size > mostDocumentBytes) return refused("too large");
  if (file.size === 0) return refused("broken");
  const contentType = documentTypes.split(",").includes(file.type) ? file.type : "application/pdf";
  const sent = await sendFile(file, {
    begin: {
      address: href("/api/deliveries/:deliveryId/documents", { deliveryId }),
      body: { name: file.name.slice(-200), bytes: file.size, contentType },
    },
    confirmAddress: (documentId) => href("/api/documents/:documentId/confirm", { documentId }),
    onProgress,
  });
  return sent.ok ? null : refused(sent.why as DocumentRefusal);
}

function refused(why: DocumentRefusal): PaperRefused {
  return { words: sendingWords[why] ?? documentRefusalWords(why), isWorthAgain: isWorthSendingAgain(why) };
}
