import { href } from "react-router";
import { sendFile, sendingWords } from "#app/domain/files/send-file.ts";
import { type DocumentRefusal, documentRefusalWords, documentTypes, mostDocumentBytes } from "./document.ts";

/**
 * Sends a paper of a delivery from the browser straight to the file store.
 *
 * @param onProgress share of the file sent, 0 to 1.
 * @returns null when it was taken in, else what to tell.
 */
export async function sendDocument(
  file: File,
  deliveryId: string,
  onProgress: (share: number) => void,
): Promise<string | null> {
  if (file.size > mostDocumentBytes) return documentRefusalWords("too large");
  if (file.size === 0) return documentRefusalWords("broken");
  const contentType = documentTypes.split(",").includes(file.type) ? file.type : "application/pdf";
  const sent = await sendFile(file, {
    begin: {
      address: href("/api/deliveries/:deliveryId/documents", { deliveryId }),
      body: { name: file.name.slice(-200), bytes: file.size, contentType },
    },
    confirmAddress: (documentId) => href("/api/documents/:documentId/confirm", { documentId }),
    onProgress,
  });
  if (sent.ok) return null;
  return sendingWords[sent.why] ?? documentRefusalWords(sent.why as DocumentRefusal);
}
