import sharp from "sharp";
import { decodeSize } from "#app/core/endgrain/decode-size.ts";
import type { PointPx } from "#app/core/endgrain/pith-fit.ts";
import type { EndPixels } from "#app/core/endgrain/pixels.ts";

/** A photograph's pixels, turned the right way up, and how many of them make one of the photograph's own. */
export type DecodedPhoto = { pixels: EndPixels; scaleX: number; scaleY: number; width: number; height: number };

/**
 * Decodes a photograph (any format sharp reads) to raw RGB at the size worth reading. `width` and `height` are the photograph's
 * own, after its EXIF orientation. @throws Error when the file is missing or is no picture.
 */
export async function decodePhoto(source: string | Buffer, corners?: readonly PointPx[]): Promise<DecodedPhoto> {
  const image = sharp(source, { limitInputPixels: 120_000_000, sequentialRead: true, failOn: "error" });
  const { width: rawWidth, height: rawHeight, autoOrient } = await image.metadata();
  const width = autoOrient?.width ?? rawWidth;
  const height = autoOrient?.height ?? rawHeight;
  const size = decodeSize({ width, height }, corners);
  const turned = image.autoOrient();
  const sized = size.scale < 1 ? turned.resize(size.width, size.height, { fit: "fill", kernel: "linear" }) : turned;
  const { data, info } = await sized
    .flatten({ background: "#fff" })
    .toColourspace("srgb")
    .raw()
    .toBuffer({ resolveWithObject: true });
  const pixels = {
    width: info.width,
    height: info.height,
    data: new Uint8Array(data.buffer, data.byteOffset, data.length),
  };
  return { pixels, scaleX: info.width / width, scaleY: info.height / height, width, height };
}
