/** In-place fast Fourier transforms of `lines` lines of `count` (a power of two) complex numbers. `inverse` does not divide. */
export function transformLines(
  re: Float32Array,
  im: Float32Array,
  { count, step, lines, lineStep }: { count: number; step: number; lines: number; lineStep: number },
  inverse: boolean,
): void {
  const half = count >> 1;
  const cos = new Float32Array(half);
  const sin = new Float32Array(half);
  for (let i = 0; i < half; i++) {
    const angle = ((inverse ? 2 : -2) * Math.PI * i) / count;
    cos[i] = Math.cos(angle);
    sin[i] = Math.sin(angle);
  }
  const a = new Float32Array(count);
  const b = new Float32Array(count);
  const bits = Math.log2(count);
  const order = Uint32Array.from({ length: count }, (_, i) => reversedBits(i, bits));
  for (let l = 0; l < lines; l++) {
    const base = l * lineStep;
    for (let i = 0; i < count; i++) {
      a[order[i]!] = re[base + i * step]!;
      b[order[i]!] = im[base + i * step]!;
    }
    for (let size = 2; size <= count; size <<= 1) {
      const wing = size >> 1;
      const turn = count / size;
      for (let start = 0; start < count; start += size) {
        for (let k = 0, w = 0; k < wing; k++, w += turn) {
          const low = start + k;
          const high = low + wing;
          const c = cos[w]!;
          const s = sin[w]!;
          const x = a[high]! * c - b[high]! * s;
          const y = a[high]! * s + b[high]! * c;
          a[high] = a[low]! - x;
          b[high] = b[low]! - y;
          a[low]! += x;
          b[low]! += y;
        }
      }
    }
    for (let i = 0; i < count; i++) {
      re[base + i * step] = a[i]!;
      im[base + i * step] = b[i]!;
    }
  }
}

function reversedBits(value: number, bits: number): number {
  let out = 0;
  for (let i = 0; i < bits; i++) if (value & (1 << i)) out |= 1 << (bits - 1 - i);
  return out >>> 0;
}
