import { halved } from "#app/core/endgrain/blur.ts";
import { transformLines } from "#app/core/endgrain/fourier.ts";
import { emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** Straight marks of one saw: waves a pixel along x and y, how well they keep step over the whole end, and their part of the variance. */
export type SawMarks = { waveX: number; waveY: number; inStep: number; share: number };

/**
 * Straight marks of fixed pitch keep step from one side of the end to the other; rings, which bend and vary in width, do not.
 * On the development photographs, which have no such marks, the strongest wave kept step by 0.79 at most; generated saw marks by
 * 0.92 at least.
 */
const IN_STEP = 0.86;
/** Part of the variance below which marks do no harm. */
const LEAST_SHARE = 0.02;
/** Waves longer than this part of the thickness are light and shade, not a saw's pitch. */
const LONGEST_PART = 1 / 3;

const BLOCKS = { columns: 12, rows: 3 };

/** Looks for the marks of a saw in an evened-out picture. @returns null when no straight pattern keeps step over the end. */
export function findSawMarks(picture: Plane): SawMarks | null {
  const small = Math.min(picture.width, picture.height) >= 80 ? halved(picture) : picture;
  let wave = strongestWave(small);
  if (!wave) return null;
  let blocks = demodulate(small, wave.x, wave.y);
  // The transform knows the wave to about half a cycle over the end; the phases of the blocks tell it ten times better.
  for (let round = 0; round < 2; round++) {
    const better = refineWave(small, wave, blocks);
    const again = demodulate(small, better.x, better.y);
    if (again.inStep <= blocks.inStep) break;
    wave = better;
    blocks = again;
  }
  if (blocks.inStep < IN_STEP || blocks.share < LEAST_SHARE) return null;
  const factor = small.width / picture.width;
  return { waveX: wave.x * factor, waveY: wave.y * factor, inStep: blocks.inStep, share: blocks.share };
}

/** Takes the marks off: the mean along lines parallel to them is subtracted, whatever shape it has. Rings bend across such lines and average out. */
export function withoutSawMarks(picture: Plane, marks: SawMarks): Plane {
  const length = Math.hypot(marks.waveX, marks.waveY);
  const ux = marks.waveX / length;
  const uy = marks.waveY / length;
  const low = Math.min(0, ux * picture.width) + Math.min(0, uy * picture.height);
  const count = Math.ceil(Math.abs(ux) * picture.width + Math.abs(uy) * picture.height) + 2;
  const sum = new Float32Array(count);
  const weight = new Float32Array(count);
  const place = (x: number, y: number) => ux * (x + 0.5) + uy * (y + 0.5) - low;
  for (let y = 0; y < picture.height; y++) {
    for (let x = 0; x < picture.width; x++) {
      const at = place(x, y);
      const bin = Math.floor(at);
      sum[bin]! += picture.data[y * picture.width + x]! * (1 - at + bin);
      sum[bin + 1]! += picture.data[y * picture.width + x]! * (at - bin);
      weight[bin]! += 1 - at + bin;
      weight[bin + 1]! += at - bin;
    }
  }
  for (let i = 0; i < count; i++) sum[i] = weight[i]! > 0 ? sum[i]! / weight[i]! : 0;
  const out = emptyPlane(picture.width, picture.height);
  for (let y = 0; y < picture.height; y++) {
    for (let x = 0; x < picture.width; x++) {
      const at = place(x, y);
      const bin = Math.floor(at);
      const i = y * picture.width + x;
      out.data[i] = picture.data[i]! - sum[bin]! * (1 - at + bin) - sum[bin + 1]! * (at - bin);
    }
  }
  return out;
}

function strongestWave(picture: Plane): { x: number; y: number } | null {
  const { width, height } = picture;
  const across = 2 ** Math.ceil(Math.log2(width));
  const down = 2 ** Math.ceil(Math.log2(height));
  const re = new Float32Array(across * down);
  const im = new Float32Array(across * down);
  for (let y = 0; y < height; y++) re.set(picture.data.subarray(y * width, (y + 1) * width), y * across);
  transformLines(re, im, { count: across, step: 1, lines: height, lineStep: across }, false);
  transformLines(re, im, { count: down, step: across, lines: across / 2 + 1, lineStep: 1 }, false);
  let best: { x: number; y: number } | null = null;
  let most = 0;
  for (let y = 0; y < down; y++) {
    const waveY = (y > down / 2 ? y - down : y) / down;
    for (let x = 0; x <= across / 2; x++) {
      const power = re[y * across + x]! ** 2 + im[y * across + x]! ** 2;
      if (power <= most || Math.hypot(x / across, waveY) * height * LONGEST_PART < 1) continue;
      most = power;
      best = { x: x / across, y: waveY };
    }
  }
  return best;
}

type Demodulated = { re: Float64Array; im: Float64Array; inStep: number; share: number };

/** The wave's strength and phase in each block of the end. */
function demodulate(picture: Plane, waveX: number, waveY: number): Demodulated {
  const { columns, rows } = BLOCKS;
  const re = new Float64Array(columns * rows);
  const im = new Float64Array(columns * rows);
  let total = 0;
  const stepC = Math.cos(2 * Math.PI * waveX);
  const stepS = Math.sin(2 * Math.PI * waveX);
  for (let y = 0; y < picture.height; y++) {
    const row = Math.floor((y * rows) / picture.height) * columns;
    let c = Math.cos(2 * Math.PI * waveY * y);
    let s = Math.sin(2 * Math.PI * waveY * y);
    for (let x = 0; x < picture.width; x++) {
      const value = picture.data[y * picture.width + x]!;
      const block = row + Math.floor((x * columns) / picture.width);
      re[block]! += value * c;
      im[block]! -= value * s;
      total += value * value;
      const turned = c * stepC - s * stepS;
      s = s * stepC + c * stepS;
      c = turned;
    }
  }
  let sumRe = 0;
  let sumIm = 0;
  let lengths = 0;
  for (let b = 0; b < re.length; b++) {
    sumRe += re[b]!;
    sumIm += im[b]!;
    lengths += Math.hypot(re[b]!, im[b]!);
  }
  const whole = Math.hypot(sumRe, sumIm);
  const area = picture.width * picture.height;
  return {
    re,
    im,
    inStep: lengths > 0 ? whole / lengths : 0,
    share: total > 0 ? (2 * whole * whole) / (area * total) : 0,
  };
}

/** A wave turned and stretched so that the phases of neighbouring blocks agree (weighted mean phase step along each direction). */
function refineWave(picture: Plane, wave: { x: number; y: number }, blocks: Demodulated): { x: number; y: number } {
  const { columns, rows } = BLOCKS;
  const step = (dx: number, dy: number) => {
    let re = 0;
    let im = 0;
    for (let row = 0; row + dy < rows; row++) {
      for (let column = 0; column + dx < columns; column++) {
        const a = row * columns + column;
        const b = a + dy * columns + dx;
        re += blocks.re[a]! * blocks.re[b]! + blocks.im[a]! * blocks.im[b]!;
        im += blocks.re[a]! * blocks.im[b]! - blocks.im[a]! * blocks.re[b]!;
      }
    }
    return Math.atan2(im, re) / (2 * Math.PI);
  };
  return { x: wave.x + (step(1, 0) * columns) / picture.width, y: wave.y + (step(0, 1) * rows) / picture.height };
}
