import { deflateSync } from "node:zlib";
import sharp, { type Sharp } from "sharp";

export const pictureFormats = ["jpeg", "png", "webp", "avif"] as const;
type PictureFormat = (typeof pictureFormats)[number];

/** A word that stands in a picture's hidden notes, beside the place it was taken. */
export const hiddenWord = "Quarry Lane";

interface Asked {
  format?: PictureFormat;
  widthPx?: number;
  heightPx?: number;
  /** How it is turned, 1 to 8 as Exif counts. */
  orientation?: number;
}

/** Red above, blue below, so that one sees which way up it is; with notes that say where it was taken. */
export async function aPicture({
  format = "jpeg",
  widthPx = 64,
  heightPx = 40,
  orientation = 1,
}: Asked = {}): Promise<Buffer> {
  const half = { width: widthPx, height: heightPx / 2, channels: 3 as const };
  const below = await sharp({ create: { ...half, background: "#0000ff" } })
    .png()
    .toBuffer();
  return sharp({ create: { ...half, height: heightPx, background: "#ff0000" } })
    .composite([{ input: below, gravity: "south" }])
    .withMetadata({ orientation })
    .withExif({
      IFD0: { Copyright: hiddenWord, Orientation: String(orientation) },
      IFD3: { GPSLatitude: "51/1 30/1 0/1", GPSLatitudeRef: "N" },
    })
    .withXmp(`<x:xmpmeta xmlns:x="adobe:ns:meta/"><place>${hiddenWord}</place></x:xmpmeta>`)
    .toFormat(format, format === "avif" ? { effort: 0 } : {})
    .toBuffer();
}

/** A PNG of one colour, a bit a pixel: 20,000 by 20,000 are 49 kB. */
export function hugePng(widthPx: number, heightPx: number, extraChunks: Buffer[] = []): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(widthPx, 0);
  head.writeUInt32BE(heightPx, 4);
  head[8] = 1;
  const pixels = deflateSync(Buffer.alloc((1 + Math.ceil(widthPx / 8)) * heightPx));
  return Buffer.concat([
    Buffer.from("\x89PNG\r\n\x1a\n", "latin1"),
    pngChunk("IHDR", head),
    ...extraChunks,
    pngChunk("IDAT", pixels),
    pngChunk("IEND", Buffer.alloc(0)),
  ]);
}

/** A chunk of a PNG with its check sum. */
export function pngChunk(name: string, body: Buffer): Buffer {
  const named = Buffer.concat([Buffer.from(name, "latin1"), body]);
  let sum = 0xffffffff;
  for (const byte of named) {
    sum ^= byte;
    for (let bit = 0; bit < 8; bit++) sum = sum & 1 ? (sum >>> 1) ^ 0xedb88320 : sum >>> 1;
  }
  const chunk = Buffer.alloc(named.length + 8);
  chunk.writeUInt32BE(body.length, 0);
  named.copy(chunk, 4);
  chunk.writeUInt32BE((sum ^ 0xffffffff) >>> 0, chunk.length - 4);
  return chunk;
}

/** A WebP of a few bytes whose frame says that it is as large as a WebP can be, 16,383 by 16,383 (RFC 6386, 9.1). */
export async function hugeWebp(): Promise<Buffer> {
  const file = await plain().webp().toBuffer();
  const frame = file.indexOf("VP8 ") + 8;
  file.writeUInt16LE(16_383, frame + 6);
  file.writeUInt16LE(16_383, frame + 8);
  return file;
}

/** An AVIF of a few bytes whose box ispe says that it is so many pixels wide and high (ISO/IEC 23008-12, 6.5.3). */
export async function claimedAvif(sidePx: number): Promise<Buffer> {
  const file = await plain().avif({ effort: 0 }).toBuffer();
  const box = file.indexOf("ispe");
  file.writeUInt32BE(sidePx, box + 8);
  file.writeUInt32BE(sidePx, box + 12);
  return file;
}

function plain(): Sharp {
  return sharp({ create: { width: 64, height: 64, channels: 3, background: "#b98a55" } });
}
