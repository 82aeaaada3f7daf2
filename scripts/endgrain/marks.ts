import { normal, placeHash, randomStream, smoothNoise } from "#scripts/endgrain/random.ts";
import type { RgbPicture } from "#scripts/endgrain/render-end.ts";

/** What may lie on an end or on its photograph besides the rings. Lengths in pixels of the picture; everything optional. */
export type Marks = {
  /** Straight ripples of a saw: direction of the marks (degrees, 0 = along the wide face), distance between them, depth in grey levels. */
  saw?: { angleDeg: number; pitchPx: number; depth: number };
  /** Dark cracks running out from a point (the pith), as drying leaves them. */
  checks?: { count: number; from: { x: number; y: number }; widthPx: number };
  /** Wax or paint over part of the end: colour, how much of the end, how opaque (0..1), brush direction in degrees. */
  coat?: { colour: [number, number, number]; cover: number; opacity: number; brushDeg: number };
  /** Pencil or crayon strokes. */
  strokes?: { count: number; widthPx: number; colour: [number, number, number] };
  /** A shadow's edge across the picture: direction of the edge, where along the width (0..1) it crosses, brightness inside (0..1), softness in pixels. */
  shadow?: { angleDeg: number; at: number; brightness: number; softPx: number };
  blurPx?: number;
  /** Camera noise, spread in grey levels. */
  noise?: number;
};

/** Draws the marks over a copy of the picture, in the order they come about: saw, checks, strokes, coat, shadow, lens, sensor. */
export function withMarks(picture: RgbPicture, marks: Marks, seed: number): RgbPicture {
  const out = { ...picture, data: new Uint8Array(picture.data) };
  if (marks.saw) addSaw(out, marks.saw, seed);
  if (marks.checks) addChecks(out, marks.checks, seed);
  if (marks.strokes) addStrokes(out, marks.strokes, seed);
  if (marks.coat) addCoat(out, marks.coat, seed);
  if (marks.shadow) addShadow(out, marks.shadow);
  const soft = marks.blurPx ? blurRgb(out, marks.blurPx) : out;
  if (marks.noise) addNoise(soft, marks.noise, seed);
  return soft;
}

type Change = (x: number, y: number, value: number, channel: number) => number;

function repaint(picture: RgbPicture, change: Change): void {
  for (let y = 0; y < picture.height; y++) {
    for (let x = 0; x < picture.width; x++) {
      const at = (y * picture.width + x) * 3;
      for (let c = 0; c < 3; c++) {
        picture.data[at + c] = Math.max(0, Math.min(255, Math.round(change(x, y, picture.data[at + c]!, c))));
      }
    }
  }
}

function addSaw(picture: RgbPicture, saw: NonNullable<Marks["saw"]>, seed: number): void {
  const angle = (saw.angleDeg * Math.PI) / 180;
  repaint(picture, (x, y, value) => {
    const across = (-x * Math.sin(angle) + y * Math.cos(angle)) / saw.pitchPx;
    const tooth = Math.floor(across);
    const strength = 0.5 + placeHash(tooth, 0, seed + 31);
    return value + saw.depth * strength * Math.sin(2 * Math.PI * across);
  });
}

function addChecks(picture: RgbPicture, checks: NonNullable<Marks["checks"]>, seed: number): void {
  const random = randomStream(seed + 41);
  const rays = Array.from({ length: checks.count }, () => {
    const through = { x: random() * picture.width, y: random() * picture.height };
    const bearing = Math.atan2(through.y - checks.from.y, through.x - checks.from.x);
    const begins = Math.hypot(through.x - checks.from.x, through.y - checks.from.y);
    return { bearing, begins, length: picture.height * (0.3 + random()) };
  });
  repaint(picture, (x, y, value) => {
    let shade = 1;
    for (const ray of rays) {
      const dx = x - checks.from.x;
      const dy = y - checks.from.y;
      const along = dx * Math.cos(ray.bearing) + dy * Math.sin(ray.bearing) - ray.begins;
      if (along < 0 || along > ray.length) continue;
      const away =
        Math.abs(dy * Math.cos(ray.bearing) - dx * Math.sin(ray.bearing)) +
        1.5 * (smoothNoise(along / 9, 0, seed) - 0.5);
      const taper = checks.widthPx * (1 - along / ray.length);
      shade = Math.min(shade, 0.2 + 0.8 * Math.max(0, Math.min(1, away - taper / 2 + 0.5)));
    }
    return value * shade;
  });
}

function addStrokes(picture: RgbPicture, strokes: NonNullable<Marks["strokes"]>, seed: number): void {
  const random = randomStream(seed + 51);
  const lines = Array.from({ length: strokes.count }, () => ({
    from: { x: random() * picture.width, y: random() * picture.height },
    to: { x: random() * picture.width, y: random() * picture.height },
  }));
  repaint(picture, (x, y, value, c) => {
    let cover = 0;
    for (const { from, to } of lines) {
      const lx = to.x - from.x;
      const ly = to.y - from.y;
      const t = Math.max(0, Math.min(1, ((x - from.x) * lx + (y - from.y) * ly) / (lx * lx + ly * ly)));
      const away = Math.hypot(x - from.x - t * lx, y - from.y - t * ly);
      cover = Math.max(cover, Math.max(0, Math.min(1, strokes.widthPx / 2 - away + 0.5)));
    }
    // Wax and graphite sit on the high fibres and skip the hollows.
    const skip = 0.55 + 0.45 * smoothNoise(x / 3, y / 3, seed + 52);
    return value + (strokes.colour[c]! - value) * cover * skip;
  });
}

function addCoat(picture: RgbPicture, coat: NonNullable<Marks["coat"]>, seed: number): void {
  const angle = (coat.brushDeg * Math.PI) / 180;
  const bump = picture.height / 1.5;
  repaint(picture, (x, y, value, c) => {
    const along = x * Math.cos(angle) + y * Math.sin(angle);
    const across = y * Math.cos(angle) - x * Math.sin(angle);
    const place = smoothNoise(x / bump, y / bump, seed + 61);
    const covered = Math.max(0, Math.min(1, (coat.cover - place) * 6 + 0.5 * coat.cover));
    const streak = 0.75 + 0.5 * smoothNoise(along / 60, across / 3, seed + 62);
    return value + (coat.colour[c]! - value) * Math.min(1, covered * coat.opacity * streak);
  });
}

function addShadow(picture: RgbPicture, shadow: NonNullable<Marks["shadow"]>): void {
  const angle = (shadow.angleDeg * Math.PI) / 180;
  repaint(picture, (x, y, value) => {
    const away = (x - shadow.at * picture.width) * Math.sin(angle) - (y - picture.height / 2) * Math.cos(angle);
    const lit = 1 / (1 + Math.exp(-away / Math.max(0.5, shadow.softPx)));
    return value * (shadow.brightness + (1 - shadow.brightness) * lit);
  });
}

function addNoise(picture: RgbPicture, spread: number, seed: number): void {
  const random = randomStream(seed + 71);
  repaint(picture, (_x, _y, value) => value + spread * normal(random));
}

/** Three box blurs one after another, near enough a Gaussian of the given sigma. */
function blurRgb(picture: RgbPicture, sigmaPx: number): RgbPicture {
  const radius = Math.max(1, Math.round(sigmaPx * 0.9));
  let data = Float32Array.from(picture.data);
  const { width, height } = picture;
  for (let pass = 0; pass < 3; pass++) {
    for (const [stepX, stepY] of [
      [1, 0],
      [0, 1],
    ] as const) {
      const next = new Float32Array(data.length);
      for (let y = 0; y < height; y++) {
        for (let x = 0; x < width; x++) {
          for (let c = 0; c < 3; c++) {
            let sum = 0;
            for (let k = -radius; k <= radius; k++) {
              const px = Math.max(0, Math.min(width - 1, x + k * stepX));
              const py = Math.max(0, Math.min(height - 1, y + k * stepY));
              sum += data[(py * width + px) * 3 + c]!;
            }
            next[(y * width + x) * 3 + c] = sum / (2 * radius + 1);
          }
        }
      }
      data = next;
    }
  }
  return { width, height, data: Uint8Array.from(data, Math.round) };
}
