import sharp from "sharp";
import { describe, expect, test } from "vitest";
import { aPicture, claimedAvif, hiddenWord, hugePng, hugeWebp, pictureFormats } from "#tests/factories/pictures.ts";
import { inspectPicture } from "./inspect-picture.server.ts";

async function taken(bytes: Uint8Array) {
  const picture = await inspectPicture(bytes);
  if (!picture.ok) throw new Error(`refused: ${picture.why}`);
  return picture;
}

/** The colour in the middle of one side of a picture as people see it. */
async function colourAt(bytes: Uint8Array, side: "top" | "bottom" | "left" | "right"): Promise<"red" | "blue"> {
  const { data, info } = await sharp(bytes).autoOrient().removeAlpha().raw().toBuffer({ resolveWithObject: true });
  const x = side === "left" ? 1 : side === "right" ? info.width - 2 : info.width >> 1;
  const y = side === "top" ? 1 : side === "bottom" ? info.height - 2 : info.height >> 1;
  const at = (y * info.width + x) * info.channels;
  return (data[at] ?? 0) > (data[at + 2] ?? 0) ? "red" : "blue";
}

describe.each(pictureFormats)("a picture as %s", (format) => {
  test("is taken in three sizes, by its bytes", async () => {
    const picture = await taken(await aPicture({ format, widthPx: 640, heightPx: 400 }));
    expect(picture).toMatchObject({ contentType: `image/${format}`, extension: format, widthPx: 640, heightPx: 400 });
    const [original, screen, small] = await Promise.all(
      [picture.original, picture.screen, picture.small].map((bytes) => sharp(bytes).metadata()),
    );
    expect(original).toMatchObject({ width: 640, height: 400, format: format === "avif" ? "heif" : format });
    expect(screen).toMatchObject({ width: 640, height: 400, format: "webp" });
    expect(small).toMatchObject({ width: 400, height: 250, format: "webp" });
  });

  test("tells nobody where it was taken, in any size", async () => {
    const sent = await aPicture({ format });
    expect(sent.includes(hiddenWord)).toBe(true);
    const picture = await taken(sent);
    for (const bytes of [picture.original, picture.screen, picture.small]) {
      expect(Buffer.from(bytes).includes(hiddenWord)).toBe(false);
      expect(Buffer.from(bytes).includes("xmpmeta")).toBe(false);
      const { exif, xmp } = await sharp(bytes).metadata();
      expect(xmp).toBeUndefined();
      expect(exif?.length ?? 0).toBeLessThan(40);
    }
  });

  // Exif 2.32, tag 0x0112: 6 is seen turned right, so what is stored on top is on the right; 3 upside down; 8 turned left.
  test.each([
    { orientation: 3, blueSide: "top", upright: [64, 40] },
    { orientation: 6, blueSide: "left", upright: [40, 64] },
    { orientation: 8, blueSide: "right", upright: [40, 64] },
  ] as const)("keeps how it was held, $orientation", async ({ orientation, blueSide, upright }) => {
    const picture = await taken(await aPicture({ format, orientation }));
    expect([picture.widthPx, picture.heightPx]).toEqual(upright);
    for (const bytes of [picture.original, picture.screen, picture.small])
      expect(await colourAt(bytes, blueSide)).toBe("blue");
  });

  test.each([0.1, 0.5, 0.9, 0.99])("cut short to %d of it, is broken", async (share) => {
    const whole = await aPicture({ format, widthPx: 640, heightPx: 400 });
    expect(await inspectPicture(whole.subarray(0, Math.floor(whole.length * share)))).toEqual({
      ok: false,
      why: "broken",
    });
  });
});

describe("what is no picture that we take", () => {
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="40000" height="40000"><script>alert(1)</script></svg>`;
  test.each([
    ["nothing", ""],
    ["text", "8 1/4 x 10'6\""],
    ["an SVG", svg],
    ["a PDF", "%PDF-1.4\n1 0 obj\n<<>>\nendobj\ntrailer\n<<>>\nstartxref\n0\n%%EOF"],
    ["a page", "<!doctype html><script>alert(1)</script>"],
  ])("%s", async (_, bytes) => {
    expect(await inspectPicture(Buffer.from(bytes))).toEqual({ ok: false, why: "wrong type" });
  });

  test.each(["gif", "tiff"] as const)("a %s", async (format) => {
    const bytes = await sharp(await aPicture())
      .toFormat(format)
      .toBuffer();
    expect(await inspectPicture(bytes)).toEqual({ ok: false, why: "wrong type" });
  });

  test("a film of several pictures", async () => {
    const frames = await Promise.all([
      aPicture({ format: "png" }),
      sharp(await aPicture())
        .flip()
        .png()
        .toBuffer(),
    ]);
    const film = await sharp(frames, { join: { animated: true } })
      .webp()
      .toBuffer();
    expect(await inspectPicture(film)).toEqual({ ok: false, why: "wrong type" });
  });
});

describe("a small file of very many pixels", () => {
  /** How far memory rises above where it stood while a picture is judged, and how long that takes. */
  async function cost(bytes: Uint8Array) {
    const before = process.memoryUsage().rss;
    let most = before;
    const watch = setInterval(() => {
      most = Math.max(most, process.memoryUsage().rss);
    }, 5);
    const began = performance.now();
    const picture = await inspectPicture(bytes);
    clearInterval(watch);
    return { picture, megabytes: (most - before) / 1e6, ms: performance.now() - began };
  }

  test.each([
    ["PNG", hugePng(20_000, 20_000)],
    ["PNG strip, under 60 megapixels", hugePng(1, 59_000_000)],
    ["PNG line, under 60 megapixels", hugePng(59_000_000, 1)],
  ])("%s is refused from its header", async (_, bytes) => {
    expect(bytes.length).toBeLessThan(200_000);
    const { picture, megabytes, ms } = await cost(bytes);
    expect(picture).toEqual({ ok: false, why: "too many pixels" });
    expect(megabytes).toBeLessThan(60);
    expect(ms).toBeLessThan(1000);
  });

  test("WebP and AVIF are too", async () => {
    for (const bytes of [await hugeWebp(), await claimedAvif(20_000), await claimedAvif(65_000)]) {
      const { picture, megabytes } = await cost(bytes);
      expect(picture).toEqual({ ok: false, why: "too many pixels" });
      expect(megabytes).toBeLessThan(60);
    }
  });

  test("an AVIF that says it is smaller than it is, is broken", async () => {
    expect(await inspectPicture(await claimedAvif(16))).toEqual({ ok: false, why: "broken" });
  });

  test("60 megapixels are taken, one row more is not", async () => {
    expect(await inspectPicture(hugePng(10_000, 6_000))).toMatchObject({ ok: true, widthPx: 10_000, heightPx: 6_000 });
    expect(await inspectPicture(hugePng(10_000, 6_001))).toEqual({ ok: false, why: "too many pixels" });
  });

  test("several at once are judged one after another, so that memory holds one", async () => {
    const ended: number[] = [];
    const sizes = [3_000, 64, 2_000];
    await Promise.all(
      sizes.map((sidePx, index) => inspectPicture(hugePng(sidePx, sidePx)).then(() => ended.push(index))),
    );
    expect(ended).toEqual([0, 1, 2]);
  });

  test("a broken one does not hold up the next", async () => {
    const [broken, whole] = await Promise.all([
      inspectPicture(Buffer.from("\xff\xd8\xff", "latin1")),
      aPicture().then(inspectPicture),
    ]);
    expect([broken.ok, whole.ok]).toEqual([false, true]);
  });
});
