import { ringPath } from "#app/core/rings/end-drawing.ts";
import type { DrawnEnd } from "#app/domain/boards/end-drawing.tsx";

interface Box {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** The end drawing on paper, in black: labels come out of printers that know no wood colours. Kept to the board's proportion within the box. */
export function drawEnd(pdf: PDFKit.PDFDocument, board: DrawnEnd, box: Box): void {
  const ratio = board.widthMm / board.thicknessMm;
  const height = Math.min(box.height, box.width / ratio);
  const width = height * ratio;
  pdf.save().translate(box.x, box.y + (box.height - height) / 2);
  if (board.rings) {
    pdf.save().rect(0, 0, width, height).clip();
    pdf
      .path(ringPath(board.rings, { widthPx: width, heightPx: height, minSpacingPx: 0.55 }))
      .lineWidth(0.16)
      .stroke("#000000");
    pdf.restore();
    pdf.rect(0, 0, width, height).lineWidth(0.25).stroke("#000000");
  } else {
    pdf.rect(0, 0, width, height).lineWidth(0.25).dash(1, { space: 0.8 }).stroke("#000000").undash();
  }
  pdf.restore();
}
