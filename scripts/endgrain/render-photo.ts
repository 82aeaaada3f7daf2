import type { EndCorners } from "#app/core/endgrain/corner-check.ts";
import { squareToCorners } from "#app/core/endgrain/straighten.ts";
import { normal, randomStream, smoothNoise } from "#scripts/endgrain/random.ts";
import { type EndSpec, type RgbPicture, renderEnd } from "#scripts/endgrain/render-end.ts";
import type { WoodKindName } from "#scripts/endgrain/wood-kinds.ts";

/** A photograph of an end at the rack: the view off square (degrees), the roll of the hand, what is behind. */
export type PhotoSpec = {
  end: EndSpec;
  width: number;
  height: number;
  /** Part of the photograph's width that the end takes up. */
  fill: number;
  turnDeg: number;
  tiltDeg: number;
  rollDeg: number;
  background: "floor" | "rack";
  seed: number;
};

/** The photograph and the true corners of the end in it, pixels. */
export type RenderedPhoto = { picture: RgbPicture; corners: EndCorners };

/** Draws the photograph by a pinhole camera four board widths away. */
export function renderPhoto(spec: PhotoSpec): RenderedPhoto {
  const picture: RgbPicture = {
    width: spec.width,
    height: spec.height,
    data: new Uint8Array(spec.width * spec.height * 3),
  };
  const { end } = spec;
  const view = camera(spec);
  paintFloor(picture, spec.seed);
  if (spec.background === "rack") {
    const random = randomStream(spec.seed + 5);
    const kinds: WoodKindName[] = ["softwood", "oak", "ash", "maple", "cherry", "walnut"];
    const gapMm = 2.5;
    for (const row of [-2, -1, 0, 1, 2]) {
      const across = row === 0 ? [-1, 1] : [-1, 0, 1];
      for (const column of across) {
        const widthMm = end.widthMm * (0.9 + 0.1 * random());
        const neighbour: EndSpec = {
          ...end,
          widthMm,
          kind: kinds[Math.floor(random() * kinds.length)]!,
          seed: spec.seed * 31 + row * 7 + column,
          pxPerMm: 3,
          pith: { xMm: widthMm * random(), yMm: end.thicknessMm * (3 * random() - 1) },
        };
        paintEnd(
          picture,
          renderEnd(neighbour),
          view(column * (end.widthMm + gapMm), row * (end.thicknessMm + gapMm), widthMm, end.thicknessMm),
        );
      }
    }
  }
  const corners = view(0, 0, end.widthMm, end.thicknessMm);
  paintEnd(picture, renderEnd(end), corners);
  return { picture, corners };
}

type View = (leftMm: number, topMm: number, widthMm: number, thicknessMm: number) => EndCorners;

function camera(spec: PhotoSpec): View {
  const [turn, tilt, roll] = [spec.turnDeg, spec.tiltDeg, spec.rollDeg].map((deg) => (deg * Math.PI) / 180) as [
    number,
    number,
    number,
  ];
  const { widthMm, thicknessMm } = spec.end;
  const away = 4 * widthMm;
  const zoom = (spec.fill * spec.width * away) / widthMm;
  const project = (xMm: number, yMm: number) => {
    const x = (xMm - widthMm / 2) * Math.cos(turn);
    const depth = (xMm - widthMm / 2) * Math.sin(turn) + (yMm - thicknessMm / 2) * Math.sin(tilt);
    const y = (yMm - thicknessMm / 2) * Math.cos(tilt);
    const rx = x * Math.cos(roll) - y * Math.sin(roll);
    const ry = x * Math.sin(roll) + y * Math.cos(roll);
    return { x: spec.width / 2 + (rx * zoom) / (away + depth), y: spec.height / 2 + (ry * zoom) / (away + depth) };
  };
  return (left, top, width, thickness) => [
    project(left, top),
    project(left + width, top),
    project(left + width, top + thickness),
    project(left, top + thickness),
  ];
}

function paintFloor(picture: RgbPicture, seed: number): void {
  const random = randomStream(seed);
  for (let y = 0; y < picture.height; y++) {
    for (let x = 0; x < picture.width; x++) {
      const value = 70 + 50 * smoothNoise(x / 180, y / 180, seed) + 6 * normal(random);
      picture.data.set([value, value, value + 6], (y * picture.width + x) * 3);
    }
  }
}

/** Paints an end's picture onto four corners, looking up the nearest of its pixels. */
function paintEnd(picture: RgbPicture, end: RgbPicture, corners: EndCorners): void {
  const m = squareToCorners(corners);
  const [a, b, c, d, e, f, g, h] = m as [number, number, number, number, number, number, number, number];
  const xs = corners.map((p) => p.x);
  const ys = corners.map((p) => p.y);
  for (let y = Math.max(0, Math.floor(Math.min(...ys)) - 2); y < Math.min(picture.height, Math.max(...ys) + 2); y++) {
    for (let x = Math.max(0, Math.floor(Math.min(...xs)) - 2); x < Math.min(picture.width, Math.max(...xs) + 2); x++) {
      // Solves x = (au+bv+c)/(gu+hv+1), y = (du+ev+f)/(gu+hv+1) for u and v.
      const [px, py] = [x + 0.5, y + 0.5];
      const [a1, b1, c1] = [a - g * px, b - h * px, px - c];
      const [a2, b2, c2] = [d - g * py, e - h * py, py - f];
      const det = a1 * b2 - a2 * b1;
      const u = (c1 * b2 - c2 * b1) / det;
      const v = (a1 * c2 - a2 * c1) / det;
      const at = (y * picture.width + x) * 3;
      if (u >= 0 && u < 1 && v >= 0 && v < 1) {
        const from = (Math.floor(v * end.height) * end.width + Math.floor(u * end.width)) * 3;
        picture.data.set(end.data.subarray(from, from + 3), at);
      } else if (u > -0.012 && u < 1.012 && v > -0.06 && v < 1.06) {
        // The gap between boards lies in their shadow.
        for (let k = 0; k < 3; k++) picture.data[at + k] = picture.data[at + k]! * 0.35;
      }
    }
  }
}
