import { Figures } from "#app/components/figures.tsx";
import type { LegGrain, LegSection, LegTurn } from "#app/core/rings/leg.ts";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { EndSketch } from "./end-sketch.tsx";
import type { LegAnswer } from "./leg.ts";

/** The leg as it lies and turned to the diagonal, drawn on the end, with what each of its four sides will show. */
export function LegResult({ answer }: { answer: LegAnswer }) {
  const { asItLies, diagonal, least } = answer;
  return (
    <>
      <Figures
        title="As it lies"
        main={{ label: "All four sides straight", value: asItLies.isStraight ? "yes" : "no" }}
        drawing={<LegDrawing answer={answer} />}
        rows={sideRows(asItLies)}
      />
      <Figures
        title="Turned so that the rings run corner to corner"
        main={{
          label: turnWords(diagonal.turnDeg),
          value: diagonal.grain.isStraight ? "all four sides straight" : "still not straight all round",
        }}
        rows={[...stockRows(diagonal), ...sideRows(diagonal.grain)]}
        beyond={[
          diagonal.fitsBoard
            ? null
            : "Turned so it does not lie within this board's end: thicker or wider stock is needed.",
        ]}
      />
      <Figures
        title="The least turn that does"
        main={{
          label: least ? turnWords(least.turnDeg) : "",
          value: least ? "all four sides straight" : "no turn makes all four sides straight here",
        }}
        rows={least ? stockRows(least) : []}
        beyond={[least && !least.fitsBoard ? "It does not lie within this board's end." : null]}
      />
    </>
  );
}

function turnWords(deg: number): string {
  if (Math.abs(deg) < 0.25) return "Not turned";
  return `Turned ${Math.abs(deg).toFixed(1)}° ${deg > 0 ? "clockwise" : "anticlockwise"}`;
}

function sideRows({ sides }: LegGrain): { label: string; value: string }[] {
  return sides.map(({ side, leastDeg, greatestDeg, departsDeg, straightShare }) => ({
    label: `${side[0]?.toUpperCase()}${side.slice(1)} side`,
    value:
      departsDeg === 0
        ? `straight, rings at ${leastDeg.toFixed(0)}° to ${greatestDeg.toFixed(0)}°`
        : `off by ${departsDeg.toFixed(0)}°, rings at ${leastDeg.toFixed(0)}° to ${greatestDeg.toFixed(0)}°, ${Math.round(straightShare * 100)} % straight`,
  }));
}

function stockRows(turn: LegTurn): { label: string; value: React.ReactNode }[] {
  return [
    { label: "Stock it takes, thickness", value: <LengthText mm={Math.ceil(turn.stockThicknessMm * 10) / 10} /> },
    { label: "and width", value: <LengthText mm={Math.ceil(turn.stockWidthMm * 10) / 10} /> },
  ];
}

function LegDrawing({ answer: { field, leg, diagonal } }: { answer: LegAnswer }) {
  const turned = { ...leg, turnDeg: leg.turnDeg + diagonal.turnDeg };
  const out = Math.max(0, (Math.max(diagonal.stockThicknessMm, leg.thicknessMm) - field.thicknessMm) / 2);
  return (
    <>
      <EndSketch field={field} marginMm={out + 1}>
        {(perPx) => (
          <>
            <LegOutline leg={leg} perPx={perPx} />
            <LegOutline leg={turned} perPx={perPx} dashed />
          </>
        )}
      </EndSketch>
      <p className="mt-1 text-ink-soft text-sm">As it lies, full line; turned, dashed.</p>
    </>
  );
}

function LegOutline({ leg, perPx, dashed }: { leg: LegSection; perPx: number; dashed?: boolean }) {
  const { middle, widthMm, thicknessMm, turnDeg } = leg;
  return (
    <rect
      x={middle.xMm - widthMm / 2}
      y={middle.yMm - thicknessMm / 2}
      width={widthMm}
      height={thicknessMm}
      transform={`rotate(${turnDeg} ${middle.xMm} ${middle.yMm})`}
      fill="#ffffff"
      fillOpacity={dashed ? 0 : 0.25}
      stroke={dashed ? "#c2301c" : "#1d4ed8"}
      strokeWidth={4 * perPx}
      strokeDasharray={dashed ? `${12 * perPx} ${8 * perPx}` : undefined}
    />
  );
}
