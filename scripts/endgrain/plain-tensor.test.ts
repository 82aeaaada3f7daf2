import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { plainStationAngles, plainTensor, referencePicture } from "#scripts/endgrain/plain-tensor.ts";

type Place = { x: number; y: number; xx: number; xy: number; yy: number };
type Reference = {
  scikitImage: string;
  sums: number;
  tensors: { sigma: number; places: Place[]; stationAngles: number[] }[];
};

const file = new URL("skimage-reference.json", import.meta.url);
const reference = JSON.parse(readFileSync(file, "utf8")) as Reference;

/** Reference: scikit-image's structure_tensor, values and script in skimage-reference.{json,py}. */
describe(`the plain structure tensor against scikit-image ${reference.scikitImage}`, () => {
  const picture = referencePicture();

  it("works on the same picture", () => {
    expect(picture.data.reduce((sum, value) => sum + value, 0)).toBe(reference.sums);
  });

  it.each(reference.tensors)("sigma $sigma: tensors and station angles agree", ({ sigma, places, stationAngles }) => {
    const tensor = plainTensor(picture, sigma);
    for (const place of places) {
      const at = place.y * picture.width + place.x;
      for (const part of ["xx", "xy", "yy"] as const) {
        expect(Math.abs(tensor[part].data[at]! - place[part])).toBeLessThan(1e-4 * (1 + place.xx + place.yy));
      }
    }
    plainStationAngles(tensor, 9).forEach((angle, i) => {
      expect(angle).toBeCloseTo(stationAngles[i]!, 3);
    });
  });
});
