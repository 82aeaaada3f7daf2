/**
 * Takes a picture file's hidden notes (place, time, device, thumbnails, edits) out of its bytes without touching its pixels, so that an original can be
 * kept as it was photographed and still tell nobody where the shop is. How the picture is turned is kept.
 *
 * Formats: JPEG (ITU-T T.81, Exif in APP1), PNG (ISO/IEC 15948 chunks), WebP (RIFF container, RFC 9649).
 */
export type StrippedFormat = "jpeg" | "png" | "webp";

/** @returns the cleaned file. @throws RangeError when the bytes do not have the structure of that format. */
export function stripMetadata(bytes: Uint8Array, format: StrippedFormat, orientation: number): Uint8Array {
  if (format === "jpeg") return stripJpeg(bytes, orientation);
  return format === "png" ? stripPng(bytes) : stripWebp(bytes);
}

/** Segments that carry pixels or how to read them: everything but APP1 to APP15 and comments. APP2 may be a colour profile, APP14 says how colours are coded. */
function isNote(marker: number, bytes: Uint8Array, at: number): boolean {
  if (marker === 0xfe) return true;
  if (marker < 0xe1 || marker > 0xef || marker === 0xee) return false;
  return !(marker === 0xe2 && text(bytes, at + 4, 11) === "ICC_PROFILE");
}

function stripJpeg(bytes: Uint8Array, orientation: number): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 4 || view.getUint16(0) !== 0xffd8) throw new RangeError("not a JPEG");
  const kept: Uint8Array[] = [bytes.subarray(0, 2)];
  if (orientation > 1) kept.push(orientationSegment(orientation));
  let at = 2;
  while (at + 4 <= bytes.length) {
    if (bytes[at] !== 0xff) throw new RangeError("broken JPEG: a segment does not begin where it should");
    const marker = bytes[at + 1] as number;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    // Start of scan: the rest is pixels, to the end of this image. What phones append behind it (previews, depth, film) is left out.
    if (marker === 0xda) {
      kept.push(bytes.subarray(at, endOfImage(bytes, at)));
      return joined(kept);
    }
    const length = view.getUint16(at + 2);
    if (length < 2 || at + 2 + length > bytes.length) throw new RangeError("broken JPEG: a segment is cut short");
    if (!isNote(marker, bytes, at)) kept.push(bytes.subarray(at, at + 2 + length));
    at += 2 + length;
  }
  throw new RangeError("broken JPEG: there are no pixels");
}

/** Walks scans (a progressive JPEG has several, with tables between) to the marker that ends the image. */
function endOfImage(bytes: Uint8Array, scanAt: number): number {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  let at = scanAt;
  while (at + 4 <= bytes.length) {
    if (bytes[at] !== 0xff) {
      at += 1;
      continue;
    }
    const marker = bytes[at + 1] as number;
    if (marker === 0xd9) return at + 2;
    // A stuffed zero or a restart mark stands inside pixel data; anything else begins a segment with a length.
    const inside = marker === 0x00 || marker === 0xff || (marker >= 0xd0 && marker <= 0xd7);
    at += inside ? 1 : 2 + view.getUint16(at + 2);
  }
  return bytes.length;
}

/** An Exif segment that says only how the picture is turned (tag 0x0112). */
function orientationSegment(orientation: number): Uint8Array {
  const tiff = [
    0x4d,
    0x4d,
    0x00,
    0x2a,
    0,
    0,
    0,
    8,
    0,
    1,
    0x01,
    0x12,
    0,
    3,
    0,
    0,
    0,
    1,
    0,
    orientation,
    0,
    0,
    0,
    0,
    0,
    0,
  ];
  const body = [0x45, 0x78, 0x69, 0x66, 0, 0, ...tiff];
  return Uint8Array.from([0xff, 0xe1, 0, body.length + 2, ...body]);
}

const pngNotes = new Set(["eXIf", "tEXt", "zTXt", "iTXt", "tIME"]);

function stripPng(bytes: Uint8Array): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 8 || view.getUint32(0) !== 0x89504e47) throw new RangeError("not a PNG");
  const kept: Uint8Array[] = [bytes.subarray(0, 8)];
  let at = 8;
  while (at + 12 <= bytes.length) {
    const end = at + 12 + view.getUint32(at);
    if (end > bytes.length) throw new RangeError("broken PNG: a chunk is cut short");
    const name = text(bytes, at + 4, 4);
    if (!pngNotes.has(name)) kept.push(bytes.subarray(at, end));
    at = end;
    if (name === "IEND") return joined(kept);
  }
  throw new RangeError("broken PNG: it has no end");
}

const exifAndXmpFlags = 0b0000_1100;

function stripWebp(bytes: Uint8Array): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 12 || text(bytes, 0, 4) !== "RIFF" || text(bytes, 8, 4) !== "WEBP")
    throw new RangeError("not a WebP");
  const kept: Uint8Array[] = [bytes.slice(0, 12)];
  let at = 12;
  while (at + 8 <= bytes.length) {
    const name = text(bytes, at, 4);
    const size = view.getUint32(at + 4, true);
    const end = Math.min(bytes.length, at + 8 + size + (size % 2));
    if (at + 8 + size > bytes.length) throw new RangeError("broken WebP: a chunk is cut short");
    if (name !== "EXIF" && name !== "XMP ") {
      const chunk = bytes.slice(at, end);
      if (name === "VP8X") chunk[8] = (chunk[8] as number) & ~exifAndXmpFlags;
      kept.push(chunk);
    }
    at = end;
  }
  const file = joined(kept);
  new DataView(file.buffer).setUint32(4, file.length - 8, true);
  return file;
}

function text(bytes: Uint8Array, at: number, length: number): string {
  return String.fromCharCode(...bytes.subarray(at, at + length));
}

function joined(parts: Uint8Array[]): Uint8Array {
  const file = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    file.set(part, at);
    at += part.length;
  }
  return file;
}
