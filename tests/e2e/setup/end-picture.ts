import sharp from "sharp";
import { renderEnd } from "#scripts/endgrain/render-end.ts";

/** A generated photo of a board's end on a bench, with what is known of it. */
export interface EndPicture {
  jpeg: Buffer;
  widthPx: number;
  heightPx: number;
  /** Top left, top right, bottom right, bottom left, in the photo's pixels. */
  corners: { x: number; y: number }[];
  /** A place along a ring: from a point on the end, that many millimetres further along, in the photo's pixels. */
  alongRing: (start: { xMm: number; yMm: number }, mm: number) => { x: number; y: number };
}

const pxPerMm = 6;
const margin = { x: 80, y: 120 };

/** Draws the end with its pith where it is asked for; ring geometry is that of circles round it. */
export async function endPicture(
  size: { widthMm: number; thicknessMm: number },
  pith: { xMm: number; yMm: number },
): Promise<EndPicture> {
  const { width, height, data } = renderEnd({
    ...size,
    pith,
    ringsPerInch: 8,
    kind: "oak",
    seed: 11,
    pxPerMm,
    roundness: 0,
  });
  const jpeg = await sharp(data, { raw: { width, height, channels: 3 } })
    .extend({ top: margin.y, bottom: margin.y, left: margin.x, right: margin.x, background: { r: 60, g: 64, b: 62 } })
    .jpeg({ quality: 90 })
    .toBuffer();
  const px = (xMm: number, yMm: number) => ({ x: margin.x + xMm * pxPerMm, y: margin.y + yMm * pxPerMm });
  return {
    jpeg,
    widthPx: width + 2 * margin.x,
    heightPx: height + 2 * margin.y,
    corners: [px(0, 0), px(size.widthMm, 0), px(size.widthMm, size.thicknessMm), px(0, size.thicknessMm)],
    alongRing(start, mm) {
      const radius = Math.hypot(start.xMm - pith.xMm, start.yMm - pith.yMm);
      const angle = Math.atan2(start.yMm - pith.yMm, start.xMm - pith.xMm) + mm / radius;
      return px(pith.xMm + radius * Math.cos(angle), pith.yMm + radius * Math.sin(angle));
    },
  };
}
