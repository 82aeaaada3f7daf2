import { normal, randomStream } from "#scripts/endgrain/random.ts";

/** A stem seen from its end: where its rings close and how far they are from round. Lengths in millimetres. */
export type RingTree = {
  /** Ring ends by distance from the pith along the mean radius, rising. */
  ringEndsMm: Float64Array;
  /** How far the stem departs from round: radius × (1 + Σ part cos(order (bearing − turn))). */
  waves: { order: number; part: number; turn: number }[];
};

/**
 * A stem with the given mean ring density out to a distance. Ring widths are lognormal and follow one another (half of a ring's
 * departure carries over to the next, as good and bad years do); `roundness` 0 is a perfect circle, 1 an ordinary stem: up to
 * about 4 % oval and 1–2 % lobed (chosen by eye on the development photographs).
 */
export function growTree(options: {
  ringsPerInch: number;
  reachMm: number;
  spread: number;
  roundness: number;
  seed: number;
}): RingTree {
  const random = randomStream(options.seed);
  const meanMm = 25.4 / options.ringsPerInch;
  const ends: number[] = [];
  let departure = 0;
  let at = meanMm * (0.3 + random());
  while (at < options.reachMm + 2 * meanMm) {
    ends.push(at);
    departure = 0.5 * departure + Math.sqrt(0.75) * options.spread * normal(random);
    at += meanMm * Math.max(0.4, Math.min(1.9, Math.exp(departure - (options.spread * options.spread) / 2)));
  }
  const waves = [2, 3, 4, 5, 7].map((order) => ({
    order,
    part: (options.roundness * 0.05 * (0.3 + 0.7 * random())) / order,
    turn: random() * 2 * Math.PI,
  }));
  return { ringEndsMm: Float64Array.from(ends), waves };
}

/** Distance from the pith, evened out so that a ring has one value all round, of a place (mm) relative to the pith. */
export function evenRadius(tree: RingTree, xMm: number, yMm: number): number {
  const bearing = Math.atan2(yMm, xMm);
  let factor = 1;
  for (const wave of tree.waves) factor += wave.part * Math.cos(wave.order * (bearing - wave.turn));
  return Math.hypot(xMm, yMm) * factor;
}

/** Which ring a radius falls in and how far through it (0 where the ring begins, nearest the pith, 1 where it closes). */
export function ringAt(tree: RingTree, radiusMm: number): { ring: number; through: number; widthMm: number } {
  const ends = tree.ringEndsMm;
  let low = 0;
  let high = ends.length - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (ends[middle]! > radiusMm) high = middle;
    else low = middle + 1;
  }
  const begins = low === 0 ? 0 : ends[low - 1]!;
  const widthMm = Math.max(1e-6, ends[low]! - begins);
  return { ring: low, through: Math.max(0, Math.min(1, (radiusMm - begins) / widthMm)), widthMm };
}

/** Direction of the ring at a place relative to the pith: signed angle in degrees, positive falling to the right (y down). */
export function trueRingDeg(tree: RingTree, xMm: number, yMm: number): number {
  const h = 1e-3;
  const gx = evenRadius(tree, xMm + h, yMm) - evenRadius(tree, xMm - h, yMm);
  const gy = evenRadius(tree, xMm, yMm + h) - evenRadius(tree, xMm, yMm - h);
  const angle = (Math.atan2(gx, -gy) * 180) / Math.PI;
  return angle > 90 ? angle - 180 : angle <= -90 ? angle + 180 : angle;
}
