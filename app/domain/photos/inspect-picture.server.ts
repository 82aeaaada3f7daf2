import sharp, { type Metadata } from "sharp";
import { stripMetadata } from "#app/core/photos/strip-metadata.ts";
import { mostPhotoPixels, mostPhotoSidePx, type PhotoRefusal, photoSizes } from "./photo.ts";

export interface TakenPicture {
  ok: true;
  contentType: string;
  /** The original, pixels untouched, without place or other hidden notes (an AVIF is coded anew, as its notes cannot be cut out). */
  original: Uint8Array;
  extension: string;
  /** As the picture is seen, turned upright. */
  widthPx: number;
  heightPx: number;
  small: Uint8Array;
  screen: Uint8Array;
}

const types: Record<string, string> = { jpeg: "image/jpeg", png: "image/png", webp: "image/webp", avif: "image/avif" };

type Inspected = TakenPicture | { ok: false; why: PhotoRefusal };

let before: Promise<unknown> = Promise.resolve();

/**
 * Judges a picture by its bytes alone, whatever its name or sender says, and makes the sizes it is shown in.
 * Every pixel is decoded, so a file cut short is found; a picture of too many pixels is refused from its header, before any is.
 * One at a time in a process: a small file may hold 60 megapixels of 16 bits, interlaced, which take half a gigabyte.
 */
export function inspectPicture(bytes: Uint8Array): Promise<Inspected> {
  const inspected = before.then(() => inspectNow(bytes));
  before = inspected.catch(() => {});
  return inspected;
}

async function inspectNow(bytes: Uint8Array): Promise<Inspected> {
  const options = { limitInputPixels: mostPhotoPixels, failOn: "truncated", sequentialRead: true } as const;
  let seen: Metadata;
  try {
    seen = await sharp(bytes, { ...options, limitInputPixels: false }).metadata();
  } catch {
    // Cut short, a WebP or a small AVIF does not even give its size.
    return { ok: false, why: beginsAsPicture(bytes) ? "broken" : "wrong type" };
  }
  const format = seen.format === "heif" && seen.compression === "av1" ? "avif" : (seen.format as string);
  const contentType = types[format];
  if (!contentType || !seen.width || !seen.height || (seen.pages ?? 1) > 1) return { ok: false, why: "wrong type" };
  if (seen.width * seen.height > mostPhotoPixels || Math.max(seen.width, seen.height) > mostPhotoSidePx)
    return { ok: false, why: "too many pixels" };
  try {
    const upright = await sharp(bytes, options)
      .autoOrient()
      .toColourspace("srgb")
      .resize(fit(photoSizes.screen))
      .webp({ quality: 82 })
      .toBuffer();
    const small = await sharp(upright).resize(fit(photoSizes.small)).webp({ quality: 78 }).toBuffer();
    const turned = (seen.orientation ?? 1) >= 5;
    const original =
      format === "avif"
        ? await sharp(bytes, options).autoOrient().avif({ quality: 80, effort: 2 }).toBuffer()
        : stripMetadata(bytes, format as "jpeg" | "png" | "webp", seen.orientation ?? 1);
    return {
      ok: true,
      contentType,
      original,
      extension: format,
      widthPx: turned ? seen.height : seen.width,
      heightPx: turned ? seen.width : seen.height,
      small,
      screen: upright,
    };
  } catch {
    return { ok: false, why: "broken" };
  }
}

/** The first bytes of a JPEG, PNG, WebP or AVIF. */
function beginsAsPicture(bytes: Uint8Array): boolean {
  const head = Buffer.from(bytes.subarray(0, 12)).toString("latin1");
  return /^(\xff\xd8\xff|\x89PNG\r\n|RIFF.{4}WEBP|.{4}ftypavif)/s.test(head);
}

function fit(longest: number) {
  return { width: longest, height: longest, fit: "inside", withoutEnlargement: true } as const;
}
