/** Numbers from 0 up to 1 that look random and are the same for the same seed (a multiply-with-carry of 32 bits). */
export function sequence(seed: number): () => number {
  let [low, high] = [(Math.imul(seed, 0x9e3779b1) ^ 0x5bd1e995) >>> 0, Math.imul(seed + 7, 0x85ebca6b) >>> 0];
  return () => {
    high = (36969 * (high & 65535) + (high >>> 16)) >>> 0;
    low = (18000 * (low & 65535) + (low >>> 16)) >>> 0;
    return (((high << 16) + (low & 65535)) >>> 0) / 4294967296;
  };
}
