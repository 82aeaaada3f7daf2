import { emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** Samples of a Gaussian of the given sigma (pixels), out to three sigma unless told, summing to 1. */
export function gaussianKernel(sigmaPx: number, radius = Math.max(1, Math.ceil(3 * sigmaPx))): Float32Array {
  const kernel = new Float32Array(2 * radius + 1);
  let sum = 0;
  for (let i = -radius; i <= radius; i++) {
    const value = Math.exp((-i * i) / (2 * sigmaPx * sigmaPx));
    kernel[i + radius] = value;
    sum += value;
  }
  return kernel.map((value) => value / sum);
}

/** Samples of a Gaussian's derivative (units per pixel), scaled so that a ramp of slope 1 reads exactly 1. */
export function slopeKernel(sigmaPx: number): Float32Array {
  const gaussian = gaussianKernel(sigmaPx);
  const radius = (gaussian.length - 1) / 2;
  let moment = 0;
  const kernel = gaussian.map((value, i) => {
    moment += (i - radius) * (i - radius) * value;
    return (i - radius) * value;
  });
  return kernel.map((value) => value / moment);
}

/** Mirrors an index at the picture's edge, the edge pixel itself repeated (…1 0 0 1…), so that an edge makes no slope. */
function mirrored(index: number, length: number): number {
  let i = index;
  while (i < 0 || i >= length) i = i < 0 ? -1 - i : 2 * length - 1 - i;
  return i;
}

/** Correlates each row with a kernel of odd length. */
export function filterRows(plane: Plane, kernel: Float32Array): Plane {
  const { width, height, data } = plane;
  const out = emptyPlane(width, height);
  const radius = (kernel.length - 1) / 2;
  const padded = new Float32Array(width + 2 * radius);
  for (let y = 0; y < height; y++) {
    const row = y * width;
    for (let x = -radius; x < width + radius; x++) {
      padded[x + radius] = data[row + (x >= 0 && x < width ? x : mirrored(x, width))]!;
    }
    for (let x = 0; x < width; x++) {
      let sum = 0;
      for (let k = 0; k < kernel.length; k++) sum += kernel[k]! * padded[x + k]!;
      out.data[row + x] = sum;
    }
  }
  return out;
}

/** Correlates each column with a kernel of odd length. */
export function filterColumns(plane: Plane, kernel: Float32Array): Plane {
  const { width, height, data } = plane;
  const out = emptyPlane(width, height);
  const radius = (kernel.length - 1) / 2;
  for (let y = 0; y < height; y++) {
    const target = y * width;
    for (let k = 0; k < kernel.length; k++) {
      const weight = kernel[k]!;
      const source = mirrored(y + k - radius, height) * width;
      for (let x = 0; x < width; x++) out.data[target + x]! += weight * data[source + x]!;
    }
  }
  return out;
}

/** Gaussian blur, sigma in pixels; the edge is mirrored. */
export function blurred(plane: Plane, sigmaPx: number): Plane {
  const kernel = gaussianKernel(sigmaPx);
  return filterColumns(filterRows(plane, kernel), kernel);
}

/** Slopes of the picture seen at a scale: derivative of the Gaussian-blurred picture along x and y, per pixel. */
export function slopes(plane: Plane, sigmaPx: number): { dx: Plane; dy: Plane } {
  const smooth = gaussianKernel(sigmaPx);
  const slope = slopeKernel(sigmaPx);
  return {
    dx: filterColumns(filterRows(plane, slope), smooth),
    dy: filterRows(filterColumns(plane, slope), smooth),
  };
}

/** Half the picture in each direction: the mean of each 2 × 2 pixels; an odd last row or column is dropped. */
export function halved(plane: Plane): Plane {
  const out = emptyPlane(plane.width >> 1, plane.height >> 1);
  for (let y = 0; y < out.height; y++) {
    for (let x = 0; x < out.width; x++) {
      const at = 2 * y * plane.width + 2 * x;
      const below = at + plane.width;
      out.data[y * out.width + x] =
        (plane.data[at]! + plane.data[at + 1]! + plane.data[below]! + plane.data[below + 1]!) / 4;
    }
  }
  return out;
}

/** Mean over a square window of 2·radius+1 pixels by running sums, the window cut off at the edge. */
export function boxMean(plane: Plane, radiusPx: number): Plane {
  const { width, height, data } = plane;
  const rows = emptyPlane(width, height);
  for (let y = 0; y < height; y++) {
    const row = y * width;
    let sum = 0;
    for (let x = 0; x < Math.min(radiusPx, width); x++) sum += data[row + x]!;
    for (let x = 0; x < width; x++) {
      if (x + radiusPx < width) sum += data[row + x + radiusPx]!;
      if (x - radiusPx - 1 >= 0) sum -= data[row + x - radiusPx - 1]!;
      rows.data[row + x] = sum / (Math.min(width - 1, x + radiusPx) - Math.max(0, x - radiusPx) + 1);
    }
  }
  const out = emptyPlane(width, height);
  const sums = new Float64Array(width);
  for (let y = 0; y < Math.min(radiusPx, height); y++) {
    for (let x = 0; x < width; x++) sums[x]! += rows.data[y * width + x]!;
  }
  for (let y = 0; y < height; y++) {
    const enters = y + radiusPx;
    const leaves = y - radiusPx - 1;
    const count = Math.min(height - 1, enters) - Math.max(0, y - radiusPx) + 1;
    for (let x = 0; x < width; x++) {
      if (enters < height) sums[x]! += rows.data[enters * width + x]!;
      if (leaves >= 0) sums[x]! -= rows.data[leaves * width + x]!;
      out.data[y * width + x] = sums[x]! / count;
    }
  }
  return out;
}
