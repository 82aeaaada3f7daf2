import jsQR from "jsqr";
import { describe, expect, test } from "vitest";
import { type LabelSheet, labelPlaces, labelSheets } from "#app/core/labels/label-sheets.ts";
import { fieldFromPith } from "#app/core/rings/stations.ts";
import { allSpecies } from "#app/core/species/species.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import { codesOnFirstPage } from "#tests/print/read-codes.ts";
import { canRender, type PrintedPage, renderPage } from "#tests/print/render-page.ts";
import { type TagText, tagPdf } from "./tag-pdf.server.ts";

const mmPerInch = 25.4;
const ptPerMm = 72 / mmPerInch;

/** A tag with the longest words that there are, and an address as long as a shop's may be. */
function aTag(index: number): TagText {
  const size = { widthMm: 203.2, thicknessMm: 25.4 };
  const board: BoardSummary = {
    id: `${index}`.padStart(13, "0"),
    tag: `WO-${String(index + 1).padStart(4, "0")}`,
    species: "white-oak",
    quarters: 4,
    lengthMm: 2438.4,
    widthFarMm: null,
    state: "racked",
    ringClass: "rift",
    ringMinDeg: 32,
    ringMaxDeg: 58,
    // Every second board has not been read.
    rings: index % 2 ? null : fieldFromPith(size, { xMm: -60, yMm: 90 }, 8),
    moisturePct: null,
    figureKind: "",
    figureStrength: 0,
    armId: null,
    place: null,
    holds: [],
    ...size,
  };
  return {
    board,
    species: longestSpecies,
    size: "16/4 × 12 63/64 × 143 63/64 in",
    rings: "quartered, 61° to 90°",
    address: `https://rack.the-shared-workshop.example/boards/${board.id}`,
  };
}

const longestSpecies =
  allSpecies()
    .map(({ commonName }) => commonName)
    .sort((a, b) => b.length - a.length)[0] ?? "";
const tags = (count: number) => Array.from({ length: count }, (_, index) => aTag(index));
const perPage = (sheet: LabelSheet) => sheet.columns * sheet.rows;

/** The sizes of a PDF's pages in points, as its page objects say (ISO 32000-1, 7.7.3.3). */
function pageSizes(pdf: Uint8Array): [number, number][] {
  const text = Buffer.from(pdf).toString("latin1");
  return [...text.matchAll(/\/Type \/Page\n[\s\S]*?\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/g)].map(([, width, height]) => [
    Number(width),
    Number(height),
  ]);
}

describe.each(labelSheets.map((sheet) => ({ code: sheet.code, sheet })))("tags on $code", ({ sheet }) => {
  test("are on pages of the sheet's exact size, as many as it takes", async () => {
    const pages = pageSizes(await tagPdf(tags(perPage(sheet) + 1), sheet, 0));
    expect(pages).toHaveLength(2);
    for (const [width, height] of pages) {
      expect(width / ptPerMm).toBeCloseTo(sheet.pageWidthMm, 2);
      expect(height / ptPerMm).toBeCloseTo(sheet.pageHeightMm, 2);
    }
  });
});

describe.skipIf(!canRender).each(labelSheets.map((sheet) => ({ code: sheet.code, sheet })))(
  "tags printed on $code",
  ({ sheet }) => {
    // A label printer has 203 dots to the inch, an office printer at least 300.
    const dotsPerInch = sheet.code.startsWith("roll") ? 203 : 300;
    const dots = (mm: number) => (mm * dotsPerInch) / mmPerInch;
    const count = perPage(sheet);
    const printed = tagPdf(tags(count), sheet, 0).then((pdf) => renderPage(pdf, 1, dotsPerInch));

    test("the code of each, alone within its label, opens its board", async () => {
      const page = await printed;
      const places = labelPlaces(sheet, count);
      for (const [index, { xMm, yMm }] of places.entries()) {
        const label = cut(page, dots(xMm), dots(yMm), dots(sheet.labelWidthMm), dots(sheet.labelHeightMm));
        expect(jsQR(coloured(label), label.width, label.height)?.data).toBe(aTag(index).address);
      }
    });

    test("nothing stands outside a label, nor within a millimetre of its edge", async () => {
      const page = await printed;
      const allowed = new Uint8Array(page.dots.length);
      for (const { xMm, yMm } of labelPlaces(sheet, count))
        for (let y = Math.floor(dots(yMm + 1)); y < dots(yMm + sheet.labelHeightMm - 1); y++)
          allowed.fill(
            1,
            y * page.width + Math.floor(dots(xMm + 1)),
            y * page.width + Math.ceil(dots(xMm + sheet.labelWidthMm - 1)),
          );
      const outside = page.dots.reduce((sum, dot, at) => sum + (dot < 128 && !allowed[at] ? 1 : 0), 0);
      expect(outside).toBe(0);
    });

    // ISO/IEC 18004 asks for four modules of white round a code.
    test("words and drawing leave the code its quiet zone", async () => {
      const page = await printed;
      const { xMm = 0, yMm = 0 } = labelPlaces(sheet, 1)[0] ?? {};
      const label = cut(page, dots(xMm), dots(yMm), dots(sheet.labelWidthMm), dots(sheet.labelHeightMm));
      const code = jsQR(coloured(label), label.width, label.height);
      if (!code) throw new Error("no code was read");
      const { topLeftCorner: from, bottomRightCorner: to } = code.location;
      const module = (to.x - from.x) / (17 + 4 * code.version);
      const quiet = 3.5 * module;
      let dark = 0;
      for (let y = Math.ceil(from.y - quiet); y < to.y + quiet; y++)
        for (let x = Math.ceil(from.x - quiet); x < to.x + quiet; x++) {
          const isInside =
            x > from.x - module / 2 && x < to.x + module / 2 && y > from.y - module / 2 && y < to.y + module / 2;
          if (!isInside && (label.dots[y * label.width + x] ?? 255) < 128) dark++;
        }
      expect(dark).toBe(0);
    });
  },
);

describe.skipIf(!canRender)("a part-used sheet", () => {
  const sheet = labelSheets.find(({ code }) => code === "a4-24");

  test("is printed where it is still whole", async () => {
    if (!sheet) throw new Error("no such sheet");
    const pdf = await tagPdf(tags(4), sheet, 22);
    expect(pageSizes(pdf)).toHaveLength(2);
    expect((await codesOnFirstPage(pdf)).sort()).toEqual([aTag(0).address, aTag(1).address]);
  });
});

/** A rectangle of a page. */
function cut(page: PrintedPage, left: number, top: number, width: number, height: number): PrintedPage {
  const [x0, y0] = [Math.round(left), Math.round(top)];
  const [w, h] = [Math.min(Math.round(width), page.width - x0), Math.min(Math.round(height), page.height - y0)];
  const dots = new Uint8Array(w * h);
  for (let y = 0; y < h; y++)
    dots.set(page.dots.subarray((y0 + y) * page.width + x0, (y0 + y) * page.width + x0 + w), y * w);
  return { dots, width: w, height: h };
}

/** Grey as red, green, blue and opaque, which is what the scan page's reader takes. */
function coloured({ dots }: PrintedPage): Uint8ClampedArray {
  const pixels = new Uint8ClampedArray(dots.length * 4).fill(255);
  for (const [at, dot] of dots.entries()) pixels.fill(dot, at * 4, at * 4 + 3);
  return pixels;
}
