import { normal, placeHash, randomStream, smoothNoise } from "#scripts/endgrain/random.ts";
import { type RgbPicture, renderEnd } from "#scripts/endgrain/render-end.ts";

/** Pictures that are no single board's end; none may be read as sure. */
export const NOT_ENDS = [
  "face",
  "cathedral",
  "several",
  "stripes",
  "bricks",
  "foliage",
  "noise",
  "gradient",
  "weave",
] as const;
export type NotEndName = (typeof NOT_ENDS)[number];

const WIDTH = 800;
const HEIGHT = 240;

/** Draws one, repeatably. */
export function renderNotEnd(name: NotEndName, seed: number): RgbPicture {
  if (name === "several") return severalEnds(seed);
  const random = randomStream(seed);
  const tilt = (random() - 0.5) * 0.2;
  const pitch = 10 + 20 * random();
  const apex = { x: WIDTH * (0.2 + 0.6 * random()), y: HEIGHT / 2 };
  const shade: Record<Exclude<NotEndName, "several">, (x: number, y: number) => number> = {
    // Long straight grain with streaks of pores along it, as on a quartered face.
    face: (x, y) => {
      const across = y + tilt * x + 3 * smoothNoise(x / 160, y / 40, seed);
      return (
        30 * Math.sin((2 * Math.PI * across) / pitch + 2 * smoothNoise(0, across / 30, seed)) +
        30 * (smoothNoise(x / 70, across / 1.6, seed + 1) - 0.5)
      );
    },
    // Nested arches with streaks along the board, as on a flat-sawn face.
    cathedral: (x, y) => {
      const across = (x - apex.x) / 6 + ((y - apex.y) / 26) ** 2 * pitch * 0.7 + 6 * smoothNoise(x / 120, y / 40, seed);
      return 30 * Math.sin((2 * Math.PI * across) / pitch) + 30 * (smoothNoise(x / 70, y / 1.6, seed + 1) - 0.5);
    },
    stripes: (x, y) => 40 * Math.sign(Math.sin((2 * Math.PI * (y + tilt * 5 * x)) / pitch)),
    bricks: (x, y) => {
      const row = Math.floor(y / 34);
      const inX = (x + 46 * (row % 2)) % 92;
      return (y % 34 < 4 || inX < 4 ? 45 : 0) + 20 * placeHash(Math.floor((x + 46 * (row % 2)) / 92), row, seed);
    },
    foliage: (x, y) =>
      90 *
      (smoothNoise(x / 30, y / 30, seed) +
        0.5 * smoothNoise(x / 13, y / 13, seed + 1) +
        0.3 * smoothNoise(x / 5, y / 5, seed + 2) -
        0.9),
    noise: () => 25 * normal(random),
    gradient: (x, y) => 0.1 * x - 0.05 * y,
    weave: (x, y) => 30 * Math.sin((2 * Math.PI * x) / 11) * Math.sin((2 * Math.PI * y) / 11),
  };
  const data = new Uint8Array(WIDTH * HEIGHT * 3);
  const ground = name === "foliage" ? [80, 120, 60] : [190, 150, 105];
  for (let y = 0; y < HEIGHT; y++) {
    for (let x = 0; x < WIDTH; x++) {
      const value = shade[name](x, y) + 3 * normal(random);
      for (let c = 0; c < 3; c++)
        data[(y * WIDTH + x) * 3 + c] = Math.max(0, Math.min(255, Math.round(ground[c]! + value)));
    }
  }
  return { width: WIDTH, height: HEIGHT, data };
}

/** Six ends of other trees, two rows of three, with dark gaps between, filling the picture. */
function severalEnds(seed: number): RgbPicture {
  const data = new Uint8Array(WIDTH * HEIGHT * 3).fill(28);
  const random = randomStream(seed);
  for (let i = 0; i < 6; i++) {
    const end = renderEnd({
      widthMm: 51,
      thicknessMm: 22.6,
      pith: { xMm: -40 + 130 * random(), yMm: -60 + 140 * random() },
      ringsPerInch: 6 + 6 * random(),
      kind: i % 2 ? "oak" : "softwood",
      seed: seed * 10 + i,
      pxPerMm: 5,
    });
    const left = (i % 3) * 267 + 4;
    const top = Math.floor(i / 3) * 120 + 4;
    for (let y = 0; y < end.height; y++)
      data.set(end.data.subarray(y * end.width * 3, (y + 1) * end.width * 3), ((top + y) * WIDTH + left) * 3);
  }
  return { width: WIDTH, height: HEIGHT, data };
}
