import PDFDocument from "pdfkit";
import QRCode from "qrcode";
import { type LabelSheet, labelPlaces } from "#app/core/labels/label-sheets.ts";
import type { BoardSummary } from "#app/domain/boards/board.ts";
import atkinson from "../../../fonts/atkinson-hyperlegible-next-latin-400-normal.woff?inline";
import bricolage from "../../../fonts/bricolage-grotesque-latin-700-normal.woff?inline";
import { drawEnd } from "./pdf-end.server.ts";

export interface TagText {
  board: BoardSummary;
  species: string;
  size: string;
  rings: string;
  /** The address the QR code opens. */
  address: string;
}

const ptPerMm = 72 / 25.4;

/** Fonts come into the server's build as data, so that no path has to be right where it runs. */
const font = (dataUrl: string) => Buffer.from(dataUrl.slice(dataUrl.indexOf(",") + 1), "base64");

/** QR modules kept free round the code (ISO/IEC 18004 asks for four). */
const quietModules = 4;

/**
 * Tags as a PDF of exact size, one label each: the end drawing, tag number, species, size, and a QR code to the board's page.
 *
 * @param skip labels already used at the start of the first sheet.
 */
export async function tagPdf(tags: TagText[], sheet: LabelSheet, skip: number): Promise<Uint8Array> {
  const size: [number, number] = [sheet.pageWidthMm * ptPerMm, sheet.pageHeightMm * ptPerMm];
  const pdf = new PDFDocument({ size, margin: 0, autoFirstPage: false, info: { Title: "Board tags" } });
  const chunks: Uint8Array[] = [];
  pdf.on("data", (chunk: Uint8Array) => chunks.push(chunk));
  const done = new Promise<void>((resolve, reject) => pdf.on("end", resolve).on("error", reject));
  pdf.registerFont("tag", font(bricolage));
  pdf.registerFont("text", font(atkinson));
  let page = -1;
  labelPlaces(sheet, tags.length, skip).forEach((place, index) => {
    const tag = tags[index];
    if (!tag) return;
    if (place.page !== page) {
      pdf.addPage({ size, margin: 0 });
      page = place.page;
    }
    pdf
      .save()
      .translate(place.xMm * ptPerMm, place.yMm * ptPerMm)
      .scale(ptPerMm);
    drawTag(pdf, tag, sheet.labelWidthMm, sheet.labelHeightMm);
    pdf.restore();
  });
  pdf.end();
  await done;
  return Buffer.concat(chunks);
}

/** One tag, in millimetres from its top left corner. The code takes the height of the label on the right; words and drawing share the rest. */
function drawTag(
  pdf: PDFKit.PDFDocument,
  { board, species, size, rings, address }: TagText,
  width: number,
  height: number,
): void {
  const pad = Math.min(2.5, height * 0.08);
  const code = Math.min(height - 2 * pad, width * 0.42);
  drawCode(pdf, address, width - pad - code, (height - code) / 2, code);
  const room = width - code - 3 * pad;
  const line = (height - 2 * pad) / 5.6;
  pdf.fillColor("#000000");
  pdf
    .font("tag")
    .fontSize(fitted(pdf, "tag", board.tag, room, line * 1.75))
    .text(board.tag, pad, pad, { lineBreak: false });
  const endTop = pad + line * 1.9;
  drawEnd(pdf, board, { x: pad, y: endTop, width: room, height: line * 0.95 });
  const textTop = endTop + line * 1.15;
  [species, size, rings].forEach((words, index) => {
    pdf
      .font("text")
      .fontSize(fitted(pdf, "text", words, room, line * 0.78))
      .text(words, pad, textTop + index * line * 0.76, { lineBreak: false });
  });
}

/** The largest size up to the wanted one at which the words fit on one line. */
function fitted(pdf: PDFKit.PDFDocument, name: string, words: string, room: number, wanted: number): number {
  const width = pdf.font(name).fontSize(wanted).widthOfString(words);
  return width <= room ? wanted : (wanted * room) / width;
}

function drawCode(pdf: PDFKit.PDFDocument, address: string, x: number, y: number, side: number): void {
  const { modules } = QRCode.create(address, { errorCorrectionLevel: "M" });
  const module = side / (modules.size + 2 * quietModules);
  for (let row = 0; row < modules.size; row++)
    for (let column = 0; column < modules.size; column++)
      if (modules.get(row, column))
        pdf.rect(x + (quietModules + column) * module, y + (quietModules + row) * module, module * 1.01, module * 1.01);
  pdf.fill("#000000");
}
