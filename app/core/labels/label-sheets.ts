/** A sheet of labels, or one label of a roll, by its measures alone. All in millimetres. */
export interface LabelSheet {
  code: string;
  /** What the box says: how many, how large, on what. */
  name: string;
  pageWidthMm: number;
  pageHeightMm: number;
  columns: number;
  rows: number;
  labelWidthMm: number;
  labelHeightMm: number;
  leftMm: number;
  topMm: number;
  /** From one label's left edge to the next one's, and top to top. */
  acrossMm: number;
  downMm: number;
}

const inch = 25.4;
const letter = { pageWidthMm: 8.5 * inch, pageHeightMm: 11 * inch };
const a4 = { pageWidthMm: 210, pageHeightMm: 297 };

function roll(widthMm: number, heightMm: number): LabelSheet {
  return {
    code: `roll-${widthMm}x${heightMm}`,
    name: `Roll, ${widthMm} × ${heightMm} mm`,
    pageWidthMm: widthMm,
    pageHeightMm: heightMm,
    columns: 1,
    rows: 1,
    labelWidthMm: widthMm,
    labelHeightMm: heightMm,
    leftMm: 0,
    topMm: 0,
    acrossMm: widthMm,
    downMm: heightMm,
  };
}

/** A sheet whose labels touch and stand in the middle of the page. */
function tiled(
  code: string,
  name: string,
  page: typeof letter,
  columns: number,
  rows: number,
  labelWidthMm: number,
  labelHeightMm: number,
): LabelSheet {
  return {
    code,
    name,
    ...page,
    columns,
    rows,
    labelWidthMm,
    labelHeightMm,
    leftMm: (page.pageWidthMm - columns * labelWidthMm) / 2,
    topMm: (page.pageHeightMm - rows * labelHeightMm) / 2,
    acrossMm: labelWidthMm,
    downMm: labelHeightMm,
  };
}

/**
 * Label sizes that stationers sell under many names, by their dimensions. Common practice, no source: measure a sheet before printing a hundred.
 */
export const labelSheets: readonly LabelSheet[] = [
  roll(62, 29),
  roll(57, 32),
  roll(89, 36),
  roll(100, 50),
  {
    code: "letter-30",
    name: "Letter, 30 of 2 5/8 × 1 in",
    ...letter,
    columns: 3,
    rows: 10,
    labelWidthMm: 2.625 * inch,
    labelHeightMm: inch,
    leftMm: 0.1875 * inch,
    topMm: 0.5 * inch,
    acrossMm: 2.75 * inch,
    downMm: inch,
  },
  {
    code: "letter-10",
    name: "Letter, 10 of 4 × 2 in",
    ...letter,
    columns: 2,
    rows: 5,
    labelWidthMm: 4 * inch,
    labelHeightMm: 2 * inch,
    leftMm: 0.15625 * inch,
    topMm: 0.5 * inch,
    acrossMm: 4.1875 * inch,
    downMm: 2 * inch,
  },
  tiled("a4-24", "A4, 24 of 70 × 37 mm", a4, 3, 8, 70, 37),
  tiled("a4-12", "A4, 12 of 105 × 48 mm", a4, 2, 6, 105, 48),
  {
    code: "a4-21",
    name: "A4, 21 of 63.5 × 38.1 mm",
    ...a4,
    columns: 3,
    rows: 7,
    labelWidthMm: 63.5,
    labelHeightMm: 38.1,
    leftMm: 7.25,
    topMm: 15.15,
    acrossMm: 66,
    downMm: 38.1,
  },
];

/** The sheet of this code, or undefined. */
export function labelSheetByCode(code: string): LabelSheet | undefined {
  return labelSheets.find((sheet) => sheet.code === code);
}

/** Where a label is printed: page from 0, and its top left corner on that page. */
export interface LabelPlace {
  page: number;
  xMm: number;
  yMm: number;
}

/**
 * Places of a run of labels, row by row, page by page.
 *
 * @param skip labels at the start of the first sheet that are used up.
 */
export function labelPlaces(sheet: LabelSheet, count: number, skip = 0): LabelPlace[] {
  const perPage = sheet.columns * sheet.rows;
  return Array.from({ length: count }, (_, i) => {
    const slot = i + (skip % perPage);
    const onPage = slot % perPage;
    return {
      page: Math.floor(slot / perPage),
      xMm: sheet.leftMm + (onPage % sheet.columns) * sheet.acrossMm,
      yMm: sheet.topMm + Math.floor(onPage / sheet.columns) * sheet.downMm,
    };
  });
}
