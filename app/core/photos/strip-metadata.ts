/**
 * Takes a picture file's hidden notes (place, time, device, thumbnails, edits) out of its bytes without touching its pixels, so that an original can be
 * kept as it was photographed and still tell nobody where the shop is. How the picture is turned is kept.
 *
 * What stays is named; whatever else a file carries, known or not, goes. Formats: JPEG (ITU-T T.81, Exif in APP1), PNG (ISO/IEC 15948 chunks),
 * WebP (RIFF container, RFC 9649).
 */
export type StrippedFormat = "jpeg" | "png" | "webp";

/**
 * @param orientation how the picture is turned, 1 to 8 as Exif counts; 1 is upright.
 * @returns the cleaned file.
 * @throws RangeError when the bytes do not have the structure of that format.
 */
export function stripMetadata(bytes: Uint8Array, format: StrippedFormat, orientation: number): Uint8Array {
  if (format === "jpeg") return stripJpeg(bytes, orientation);
  return format === "png" ? stripPng(bytes, orientation) : stripWebp(bytes, orientation);
}

/**
 * Segments that carry pixels or how to read them stay: everything but comments and application segments, of which APP0 may be the size of a dot,
 * APP2 a colour profile, and APP14 say how colours are coded.
 */
function isNote(marker: number, bytes: Uint8Array, at: number): boolean {
  if (marker === 0xfe) return true;
  if (marker < 0xe0 || marker > 0xef || marker === 0xee) return false;
  if (marker === 0xe0) return text(bytes, at + 4, 4) !== "JFIF";
  return !(marker === 0xe2 && text(bytes, at + 4, 11) === "ICC_PROFILE");
}

/** Walks the segments to the end of this image. What phones append behind it (previews, depth, film) is left out. */
function stripJpeg(bytes: Uint8Array, orientation: number): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 4 || view.getUint16(0) !== 0xffd8) throw new RangeError("not a JPEG");
  const kept: Uint8Array[] = [bytes.subarray(0, 2)];
  if (orientation > 1) kept.push(orientationSegment(orientation));
  let at = 2;
  let hasPixels = false;
  while (at + 2 <= bytes.length) {
    if (bytes[at] !== 0xff) throw new RangeError("broken JPEG: a segment does not begin where it should");
    const marker = bytes[at + 1] as number;
    if (marker === 0xff) {
      at += 1;
      continue;
    }
    if (marker === 0xd9) {
      kept.push(bytes.subarray(at, at + 2));
      break;
    }
    const length = at + 4 <= bytes.length ? view.getUint16(at + 2) : 0;
    if (length < 2 || at + 2 + length > bytes.length) throw new RangeError("broken JPEG: a segment is cut short");
    // A scan's pixels follow its segment without a length of their own. A progressive JPEG has several scans, with segments between.
    const end = marker === 0xda ? endOfScan(bytes, at + 2 + length) : at + 2 + length;
    hasPixels ||= marker === 0xda;
    if (!isNote(marker, bytes, at)) kept.push(bytes.subarray(at, end));
    at = end;
  }
  if (!hasPixels) throw new RangeError("broken JPEG: there are no pixels");
  return joined(kept);
}

/** Where the next segment begins: a stuffed zero or a restart mark stands inside the pixels, any other mark behind them. */
function endOfScan(bytes: Uint8Array, from: number): number {
  for (let at = bytes.indexOf(0xff, from); at >= 0 && at + 1 < bytes.length; at = bytes.indexOf(0xff, at + 1)) {
    const marker = bytes[at + 1] as number;
    const inside = marker === 0x00 || marker === 0xff || (marker >= 0xd0 && marker <= 0xd7);
    if (!inside) return at;
  }
  return bytes.length;
}

/** The tag 0x0112 alone, as a TIFF header with one directory: all that Exif may say. */
function orientationTiff(orientation: number): Uint8Array {
  const header = [0x4d, 0x4d, 0x00, 0x2a, 0, 0, 0, 8];
  const entry = [0x01, 0x12, 0, 3, 0, 0, 0, 1, 0, orientation, 0, 0];
  return Uint8Array.from([...header, 0, 1, ...entry, 0, 0, 0, 0]);
}

function orientationSegment(orientation: number): Uint8Array {
  const body = [0x45, 0x78, 0x69, 0x66, 0, 0, ...orientationTiff(orientation)];
  return Uint8Array.from([0xff, 0xe1, 0, body.length + 2, ...body]);
}

/** Pixels and how to read them (PNG third edition, 5.6). */
const pngPixels = new Set(
  "IHDR PLTE IDAT IEND tRNS cHRM gAMA iCCP sBIT sRGB cICP mDCV cLLI bKGD hIST pHYs sPLT".split(" "),
);

function stripPng(bytes: Uint8Array, orientation: number): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 8 || view.getUint32(0) !== 0x89504e47) throw new RangeError("not a PNG");
  const kept: Uint8Array[] = [bytes.subarray(0, 8)];
  let at = 8;
  while (at + 12 <= bytes.length) {
    const end = at + 12 + view.getUint32(at);
    if (end > bytes.length) throw new RangeError("broken PNG: a chunk is cut short");
    const name = text(bytes, at + 4, 4);
    if (pngPixels.has(name)) kept.push(bytes.subarray(at, end));
    if (name === "IHDR" && orientation > 1) kept.push(pngChunk("eXIf", orientationTiff(orientation)));
    at = end;
    if (name === "IEND") return joined(kept);
  }
  throw new RangeError("broken PNG: it has no end");
}

function pngChunk(name: string, body: Uint8Array): Uint8Array {
  const chunk = new Uint8Array(body.length + 12);
  const view = new DataView(chunk.buffer);
  view.setUint32(0, body.length);
  chunk.set(new TextEncoder().encode(name), 4);
  chunk.set(body, 8);
  view.setUint32(chunk.length - 4, crc32(chunk.subarray(4, -4)));
  return chunk;
}

/** The check sum of a PNG chunk (PNG third edition, annex D). */
function crc32(bytes: Uint8Array): number {
  let sum = 0xffffffff;
  for (const byte of bytes) {
    sum ^= byte;
    for (let bit = 0; bit < 8; bit++) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1;
  }
  return (sum ^ 0xffffffff) >>> 0;
}

/** Pixels and how to read them (RFC 9649, 2.7); animations are not taken in. */
const webpPixels = new Set(["VP8X", "VP8 ", "VP8L", "ALPH", "ICCP"]);
const exifFlag = 0b0000_1000;
const xmpFlag = 0b0000_0100;

function stripWebp(bytes: Uint8Array, orientation: number): Uint8Array {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  if (bytes.length < 12 || text(bytes, 0, 4) !== "RIFF" || text(bytes, 8, 4) !== "WEBP")
    throw new RangeError("not a WebP");
  const fileEnd = 8 + view.getUint32(4, true);
  if (fileEnd > bytes.length) throw new RangeError("broken WebP: it is cut short");
  const kept: Uint8Array[] = [bytes.slice(0, 12)];
  let at = 12;
  while (at + 8 <= fileEnd) {
    const name = text(bytes, at, 4);
    const size = view.getUint32(at + 4, true);
    if (at + 8 + size > fileEnd) throw new RangeError("broken WebP: a chunk is cut short");
    const end = Math.min(fileEnd, at + 8 + size + (size % 2));
    const chunk = bytes.slice(at, end);
    if (name === "VP8X") chunk[8] = ((chunk[8] as number) & ~(exifFlag | xmpFlag)) | (orientation > 1 ? exifFlag : 0);
    if (webpPixels.has(name)) kept.push(chunk);
    at = end;
  }
  if (orientation > 1) kept.push(riffChunk("EXIF", orientationTiff(orientation)));
  const file = joined(kept);
  new DataView(file.buffer).setUint32(4, file.length - 8, true);
  return file;
}

function riffChunk(name: string, body: Uint8Array): Uint8Array {
  const chunk = new Uint8Array(8 + body.length + (body.length % 2));
  chunk.set(new TextEncoder().encode(name), 0);
  new DataView(chunk.buffer).setUint32(4, body.length, true);
  chunk.set(body, 8);
  return chunk;
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
