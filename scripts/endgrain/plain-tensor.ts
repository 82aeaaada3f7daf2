import { filterColumns, filterRows, gaussianKernel } from "#app/core/endgrain/blur.ts";
import { emptyPlane, type Plane } from "#app/core/endgrain/pixels.ts";

/** Elements of the structure tensor per pixel. */
export type PlainTensor = { xx: Plane; xy: Plane; yy: Plane };

/**
 * The plain structure tensor as scikit-image 0.19 computes it (`skimage.feature.structure_tensor(image, sigma, mode="reflect")`):
 * Sobel derivatives, their products, a Gaussian cut off at four sigmas. Here to measure the reading against, not to read with.
 */
export function plainTensor(image: Plane, sigmaPx: number): PlainTensor {
  const slope = Float32Array.of(-1, 0, 1);
  const smooth = Float32Array.of(1, 2, 1);
  const dx = filterColumns(filterRows(image, slope), smooth);
  const dy = filterRows(filterColumns(image, slope), smooth);
  const kernel = gaussianKernel(sigmaPx, Math.floor(4 * sigmaPx + 0.5));
  const product = (a: Plane, b: Plane) => {
    const out = emptyPlane(image.width, image.height);
    for (let i = 0; i < out.data.length; i++) out.data[i] = a.data[i]! * b.data[i]!;
    return filterColumns(filterRows(out, kernel), kernel);
  };
  return { xx: product(dx, dx), xy: product(dx, dy), yy: product(dy, dy) };
}

/** Ring angle to the wide face in each of `count` parts of the width, from the tensor summed over the part; degrees 0..90. */
export function plainStationAngles(tensor: PlainTensor, count: number): number[] {
  const { width, height } = tensor.xx;
  return Array.from({ length: count }, (_, s) => {
    let xx = 0;
    let xy = 0;
    let yy = 0;
    for (let y = 0; y < height; y++) {
      for (let x = Math.floor((s * width) / count); x < Math.floor(((s + 1) * width) / count); x++) {
        xx += tensor.xx.data[y * width + x]!;
        xy += tensor.xy.data[y * width + x]!;
        yy += tensor.yy.data[y * width + x]!;
      }
    }
    const normal = Math.atan2(2 * xy, xx - yy) / 2;
    return (Math.atan2(Math.abs(Math.cos(normal)), Math.abs(Math.sin(normal))) * 180) / Math.PI;
  });
}

/** The picture the reference values were made of: tilted arcs on a slope of light, whole grey levels, the same in Python. */
export function referencePicture(): Plane {
  const out = emptyPlane(180, 60);
  for (let y = 0; y < 60; y++) {
    for (let x = 0; x < 180; x++) {
      const radius = Math.hypot(x - 40, y - 130);
      out.data[y * 180 + x] = Math.floor(
        128 + 50 * Math.sin(0.45 * radius) + 0.2 * x + 15 * Math.sin(1.3 * x + 2.1 * y),
      );
    }
  }
  return out;
}
