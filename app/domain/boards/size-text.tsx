import { lengthParts } from "#app/core/lengths/print-length.ts";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";

/** One length in the shop's units. A fraction is set as one, and still copies and reads aloud as "8 1/4". */
export function LengthText({ mm, unit = true }: { mm: number; unit?: boolean }) {
  const { units } = useShop();
  const { sign, whole, numerator, denominator } = lengthParts(mm, units);
  return (
    <span className="whitespace-nowrap tabular-nums">
      {sign}
      {whole > 0 || numerator === 0 ? whole : null}
      {numerator > 0 ? (
        <>
          {whole > 0 ? " " : null}
          <span className="fraction">
            <span>{numerator}</span>/<span>{denominator}</span>
          </span>
        </>
      ) : null}
      {unit ? ` ${units}` : ""}
    </span>
  );
}

interface Sized {
  quarters: number;
  widthMm: number;
  lengthMm: number;
}

/** A board's size the way the trade says it: quarters, width, length. */
export function BoardSize({ board }: { board: Sized }) {
  return (
    <span className="whitespace-nowrap">
      {printQuarters(board.quarters)} × <LengthText mm={board.widthMm} unit={false} /> ×{" "}
      <LengthText mm={board.lengthMm} />
    </span>
  );
}
