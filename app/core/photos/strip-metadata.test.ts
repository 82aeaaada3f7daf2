import sharp from "sharp";
import { describe, expect, test } from "vitest";
import { stripMetadata } from "./strip-metadata.ts";

const exif = {
  IFD0: { Copyright: "Quarry Lane", Orientation: "6" },
  IFD3: { GPSLatitude: "51/1 30/1 0/1", GPSLatitudeRef: "N" },
};

function picture() {
  return sharp({ create: { width: 64, height: 40, channels: 3, background: "#b98a55" } }).withExif(exif);
}

// sharp (libvips) is the general-purpose reader that says what a file still tells.
describe("stripMetadata", () => {
  test("a JPEG keeps its pixels and how it is turned, and loses the rest", async () => {
    const before = await picture().withMetadata({ orientation: 6 }).withExif(exif).jpeg().toBuffer();
    expect(before.includes("Quarry Lane")).toBe(true);
    const after = Buffer.from(stripMetadata(before, "jpeg", 6));
    expect(after.includes("Quarry Lane")).toBe(false);
    const seen = await sharp(after).metadata();
    expect(seen.orientation).toBe(6);
    expect(seen.exif?.length).toBeLessThan(40);
    expect(await sharp(after).raw().toBuffer()).toEqual(await sharp(before).raw().toBuffer());
  });

  test.each(["png", "webp"] as const)("a %s keeps its pixels and loses the rest", async (format) => {
    const before = await picture().toFormat(format, { lossless: true }).toBuffer();
    expect((await sharp(before).metadata()).exif).toBeDefined();
    const after = Buffer.from(stripMetadata(before, format, 1));
    expect((await sharp(after).metadata()).exif).toBeUndefined();
    expect(await sharp(after).raw().toBuffer()).toEqual(await sharp(before).raw().toBuffer());
  });

  test("a progressive JPEG, whose scans have tables between, is kept whole", async () => {
    const noise = await sharp({
      create: {
        width: 300,
        height: 200,
        channels: 3,
        noise: { type: "gaussian", mean: 128, sigma: 40 },
        background: "#000",
      },
    })
      .jpeg({ progressive: true })
      .toBuffer();
    expect(Buffer.from(stripMetadata(noise, "jpeg", 1)).subarray(-2)).toEqual(Buffer.from([0xff, 0xd9]));
    expect(
      await sharp(stripMetadata(noise, "jpeg", 1))
        .raw()
        .toBuffer(),
    ).toEqual(await sharp(noise).raw().toBuffer());
  });

  test("what a phone hides behind the picture is left out", async () => {
    const before = Buffer.concat([
      await picture().jpeg().toBuffer(),
      Buffer.from("a film, with sound, and the place it was taken"),
    ]);
    expect(Buffer.from(stripMetadata(before, "jpeg", 1)).includes("the place")).toBe(false);
  });

  test.each(["jpeg", "png", "webp"] as const)("bytes that are no %s are refused", (format) => {
    expect(() => stripMetadata(new Uint8Array(40), format, 1)).toThrow(RangeError);
    expect(() => stripMetadata(new Uint8Array(0), format, 1)).toThrow(RangeError);
  });
});
