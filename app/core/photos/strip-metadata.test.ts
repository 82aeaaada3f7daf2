import fc from "fast-check";
import sharp from "sharp";
import { describe, expect, test } from "vitest";
import { pngChunk } from "#tests/factories/pictures.ts";
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

  // Exif in PNG is the chunk eXIf (PNG third edition, 11.3.4.6), in WebP the chunk EXIF (RFC 9649, 2.7.1.5).
  test.each(["jpeg", "png", "webp"] as const)("a %s is seen the same way up as before", async (format) => {
    const before = await picture().withMetadata({ orientation: 6 }).withExif(exif).toFormat(format).toBuffer();
    const after = Buffer.from(stripMetadata(before, format, 6));
    expect(after.includes("Quarry Lane")).toBe(false);
    expect((await sharp(after).metadata()).orientation).toBe(6);
    const upright = (file: Buffer) => sharp(file).autoOrient().raw().toBuffer({ resolveWithObject: true });
    const [was, is] = await Promise.all([upright(before), upright(after)]);
    expect([is.info.width, is.info.height]).toEqual([40, 64]);
    expect(is.data).toEqual(was.data);
  });

  describe("notes of a kind nobody has heard of go too", () => {
    const secret = Buffer.from("the place it was taken: 51.5 N");

    test("in a PNG", async () => {
      const whole = await picture().png().toBuffer();
      const headEnd = 8 + 25;
      for (const name of ["caBX", "prVt", "zTXt", "iTXt", "acTL"]) {
        const before = Buffer.concat([whole.subarray(0, headEnd), pngChunk(name, secret), whole.subarray(headEnd)]);
        expect(Buffer.from(stripMetadata(before, "png", 1)).includes("the place")).toBe(false);
      }
    });

    test("in a WebP, and behind it", async () => {
      const whole = await picture().webp().toBuffer();
      const chunk = Buffer.concat([Buffer.from("C2PA"), Buffer.from([secret.length, 0, 0, 0]), secret]);
      const before = Buffer.concat([whole, chunk]);
      expect(Buffer.from(stripMetadata(before, "webp", 1)).includes("the place")).toBe(false);
      before.writeUInt32LE(before.length - 8, 4);
      const after = Buffer.from(stripMetadata(before, "webp", 1));
      expect(after.includes("the place")).toBe(false);
      expect(await sharp(after).raw().toBuffer()).toEqual(await sharp(whole).raw().toBuffer());
    });

    test("in a JPEG, before its pixels or between two scans of them", async () => {
      const whole = await picture().jpeg({ progressive: true }).toBuffer();
      const scans = [...whole.keys()].filter((at) => whole[at] === 0xff && whole[at + 1] === 0xda);
      expect(scans.length).toBeGreaterThan(2);
      for (const at of [2, ...scans])
        for (const marker of [0xe0, 0xe1, 0xe2, 0xeb, 0xed, 0xfe]) {
          const note = Buffer.concat([Buffer.from([0xff, marker, 0, secret.length + 2]), secret]);
          const before = Buffer.concat([whole.subarray(0, at), note, whole.subarray(at)]);
          const after = Buffer.from(stripMetadata(before, "jpeg", 1));
          expect(after.includes("the place")).toBe(false);
          expect(await sharp(after).raw().toBuffer()).toEqual(await sharp(whole).raw().toBuffer());
        }
    });
  });

  test.each(["jpeg", "png", "webp"] as const)(
    "a damaged %s is cleaned or refused, and nothing else",
    async (format) => {
      const whole = await picture().toFormat(format).toBuffer();
      const damage = fc.record({
        edits: fc.array(fc.tuple(fc.nat(whole.length - 1), fc.nat(255)), { minLength: 1, maxLength: 6 }),
        length: fc.integer({ min: 0, max: whole.length }),
      });
      fc.assert(
        fc.property(damage, ({ edits, length }) => {
          const bytes = Uint8Array.from(whole);
          for (const [at, byte] of edits) bytes[at] = byte;
          try {
            const after = stripMetadata(bytes.subarray(0, length), format, 6);
            expect(after.length).toBeLessThanOrEqual(length + 60);
          } catch (error) {
            expect(error).toBeInstanceOf(RangeError);
          }
        }),
        { numRuns: 500 },
      );
    },
  );

  test.each(["jpeg", "png", "webp"] as const)("bytes that are no %s are refused", (format) => {
    expect(() => stripMetadata(new Uint8Array(40), format, 1)).toThrow(RangeError);
    expect(() => stripMetadata(new Uint8Array(0), format, 1)).toThrow(RangeError);
  });
});
