import { inspectPicture } from "#app/domain/photos/inspect-picture.server.ts";
import type { DocumentRefusal } from "./document.ts";

export type InspectedDocument =
  | { ok: true; contentType: string; extension: string; bytes: Uint8Array }
  | { ok: false; why: DocumentRefusal };

/** How much of the end of a PDF its trailer may be in (ISO 32000-1, 7.5.5; readers look through the last 1,024 bytes). */
const trailerBytes = 1024;

/**
 * Judges a document by its bytes alone. A PDF begins as one and has its trailer, so a file cut short is found; what is in between nobody opens here:
 * it is handed out as a file, never shown as a page. A picture is decoded whole and loses where it was taken.
 */
export async function inspectDocument(bytes: Uint8Array): Promise<InspectedDocument> {
  if (startsWith(bytes, "%PDF-")) {
    const end = Buffer.from(bytes.subarray(-trailerBytes)).toString("latin1");
    if (!/startxref\s+\d+\s+%%EOF/.test(end)) return { ok: false, why: "broken" };
    return { ok: true, contentType: "application/pdf", extension: "pdf", bytes };
  }
  const picture = await inspectPicture(bytes);
  if (!picture.ok) return picture;
  return { ok: true, contentType: picture.contentType, extension: picture.extension, bytes: picture.original };
}

function startsWith(bytes: Uint8Array, text: string): boolean {
  return Buffer.from(bytes.subarray(0, text.length)).toString("latin1") === text;
}
