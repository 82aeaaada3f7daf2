/** A picture as it comes from the decoder: 1 (grey) or 3 (red, green, blue) bytes a pixel, rows from the top, no padding. */
export type EndPixels = { width: number; height: number; data: Uint8Array };

/** One number a pixel, rows from the top. */
export type Plane = { width: number; height: number; data: Float32Array };

/** @returns an all-zero plane. */
export function emptyPlane(width: number, height: number): Plane {
  return { width, height, data: new Float32Array(width * height) };
}

/** Bytes a pixel of a picture. @throws RangeError when the data do not fit the size. */
export function channelsOf(pixels: EndPixels): 1 | 3 {
  const { width, height, data } = pixels;
  if (!Number.isInteger(width) || !Number.isInteger(height) || width < 1 || height < 1) {
    throw new RangeError("a picture needs a width and a height of at least one pixel");
  }
  if (data.length === width * height) return 1;
  if (data.length === width * height * 3) return 3;
  throw new RangeError("the picture's data do not fit its width and height");
}
