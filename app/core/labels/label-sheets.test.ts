import { describe, expect, test } from "vitest";
import { labelPlaces, labelSheetByCode, labelSheets } from "./label-sheets.ts";

describe("label sheets", () => {
  test.each(labelSheets.map((sheet) => [sheet.code, sheet] as const))(
    "%s: every label lies on the page and none on another",
    (_code, sheet) => {
      const places = labelPlaces(sheet, sheet.columns * sheet.rows);
      for (const { page, xMm, yMm } of places) {
        expect(page).toBe(0);
        expect(xMm).toBeGreaterThanOrEqual(0);
        expect(yMm).toBeGreaterThanOrEqual(0);
        expect(xMm + sheet.labelWidthMm).toBeLessThanOrEqual(sheet.pageWidthMm + 1e-6);
        expect(yMm + sheet.labelHeightMm).toBeLessThanOrEqual(sheet.pageHeightMm + 1e-6);
      }
      expect(sheet.acrossMm).toBeGreaterThanOrEqual(sheet.labelWidthMm);
      expect(sheet.downMm).toBeGreaterThanOrEqual(sheet.labelHeightMm);
      expect(new Set(places.map(({ xMm, yMm }) => `${xMm} ${yMm}`)).size).toBe(places.length);
    },
  );

  test("a part-used sheet begins where it is still whole, then turns the page", () => {
    const sheet = labelSheetByCode("a4-24");
    if (!sheet) throw new Error("no such sheet");
    const places = labelPlaces(sheet, 3, 22);
    expect(places.map((place) => place.page)).toEqual([0, 0, 1]);
    expect(places[2]).toMatchObject({ xMm: 0, yMm: 0.5 });
  });
});
