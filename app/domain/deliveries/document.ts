/** A paper that came with a delivery: an invoice, a certificate. */
export interface DeliveryDocument {
  id: string;
  name: string;
  contentType: string;
  bytes: number;
  addedBy: string;
  addedAt: Date;
}

export const mostDocumentBytes = 25 * 1024 * 1024;

/** What a device offers to choose from. The server believes the bytes only. */
export const documentTypes = "application/pdf,image/jpeg,image/png,image/webp,image/avif";

const extensions: Record<string, string> = {
  "application/pdf": "pdf",
  "image/jpeg": "jpg",
  "image/png": "png",
  "image/webp": "webp",
  "image/avif": "avif",
};

/** Why a document was not taken in. */
export type DocumentRefusal = "not arrived" | "too large" | "wrong type" | "too many pixels" | "broken";

const words: Record<DocumentRefusal, string> = {
  "not arrived": "The document did not arrive. Send it again.",
  "too large": "That file is over 25 MB. Scan it at a lower resolution.",
  "wrong type": "That is not a PDF, nor a JPEG, PNG, WebP or AVIF picture.",
  "too many pixels": "That picture is over 60 megapixels. Scan it at a lower resolution.",
  broken: "The file is cut short or damaged. Scan or save it again.",
};

/** What to tell somebody whose document was refused. */
export function documentRefusalWords(refusal: DocumentRefusal): string {
  return words[refusal];
}

/** A file's name as it may be kept and handed back: no folders, nothing that is no letter of a name, and the ending that its bytes have. */
export function documentName(given: string, contentType: string): string {
  const extension = extensions[contentType] ?? "bin";
  const plain = given
    .replace(/^.*[\\/]/, "")
    .replace(/[\p{Cc}\p{Cf}\p{Zl}\p{Zp}"<>|:*?]/gu, " ")
    .replace(/\s+/g, " ")
    .replace(/\.(pdf|jpe?g|png|webp|avif)$/i, "")
    .trim()
    .slice(0, 180);
  return `${plain || "document"}.${extension}`;
}

/** "1.4 MB", "212 KB". */
export function printBytes(bytes: number): string {
  return bytes >= 1_000_000 ? `${(bytes / 1_000_000).toFixed(1)} MB` : `${Math.max(1, Math.round(bytes / 1000))} KB`;
}
