import sharp, { type Metadata } from "sharp";
import { stripMetadata } from "#app/core/photos/strip-metadata.ts";
import { mostPhotoPixels, type PhotoRefusal, photoSizes } from "./photo.ts";

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

/**
 * Judges a picture by its bytes alone, whatever its name or sender says, and makes the sizes it is shown in.
 * Every pixel is decoded, so a file cut short is found; a picture of too many pixels is refused from its header, before any is.
 */
export async function inspectPicture(bytes: Uint8Array): Promise<TakenPicture | { ok: false; why: PhotoRefusal }> {
  const options = { limitInputPixels: mostPhotoPixels, failOn: "truncated", sequentialRead: true } as const;
  let seen: Metadata;
  try {
    seen = await sharp(bytes, { ...options, limitInputPixels: false }).metadata();
  } catch {
    return { ok: false, why: "wrong type" };
  }
  const format = seen.format === "heif" && seen.compression === "av1" ? "avif" : (seen.format as string);
  const contentType = types[format];
  if (!contentType || !seen.width || !seen.height || (seen.pages ?? 1) > 1) return { ok: false, why: "wrong type" };
  if (seen.width * seen.height > mostPhotoPixels) return { ok: false, why: "too many pixels" };
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

function fit(longest: number) {
  return { width: longest, height: longest, fit: "inside", withoutEnlargement: true } as const;
}
