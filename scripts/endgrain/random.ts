/** A repeatable stream of numbers 0..1 from a seed (mulberry32, a public-domain generator). */
export function randomStream(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = Math.imul(state ^ (state >>> 15), state | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** A number 0..1 that depends only on three whole numbers: the same place always looks the same. */
export function placeHash(a: number, b: number, c: number): number {
  let h = Math.imul(a | 0, 0x9e3779b1) ^ Math.imul(b | 0, 0x85ebca6b) ^ Math.imul(c | 0, 0xc2b2ae35);
  h = Math.imul(h ^ (h >>> 15), 0x2c1b3c6d);
  h = Math.imul(h ^ (h >>> 12), 0x297a2d39);
  return ((h ^ (h >>> 15)) >>> 0) / 4294967296;
}

/** About normal, mean 0 and spread 1, from a stream (sum of twelve). */
export function normal(random: () => number): number {
  let sum = -6;
  for (let i = 0; i < 12; i++) sum += random();
  return sum;
}

/** Smooth noise 0..1 over the plane, one bump per unit (value noise). */
export function smoothNoise(x: number, y: number, seed: number): number {
  const i = Math.floor(x);
  const j = Math.floor(y);
  const fx = fade(x - i);
  const fy = fade(y - j);
  const top = placeHash(i, j, seed) * (1 - fx) + placeHash(i + 1, j, seed) * fx;
  const bottom = placeHash(i, j + 1, seed) * (1 - fx) + placeHash(i + 1, j + 1, seed) * fx;
  return top * (1 - fy) + bottom * fy;
}

function fade(t: number): number {
  return t * t * (3 - 2 * t);
}
