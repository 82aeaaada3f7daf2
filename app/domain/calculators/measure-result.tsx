import { Figures } from "#app/components/figures.tsx";
import { mmPerFoot } from "#app/core/lengths/length-unit.ts";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { MeasureAnswer } from "./measure.ts";

/** The trade's figure first, then what it was before rounding, and the two other ways of counting. */
export function MeasureResult({ answer }: { answer: MeasureAnswer }) {
  const { units } = useShop();
  const { measure, bundle } = answer;
  const thickness = answer.board.thicknessMm === null ? "nominal" : "measured";
  return (
    <Figures
      title={answer.count === 1 ? "One board" : `${answer.count} boards alike`}
      main={
        units === "in"
          ? { label: "Board feet, as the trade counts them", value: `${figure(measure.boardFeet)} bf` }
          : { label: `Volume, ${thickness} thickness`, value: `${measure.volumeM3.toFixed(4)} m³` }
      }
      drawing={<PlanDrawing answer={answer} />}
      rows={[
        ...(units === "mm"
          ? [{ label: "Board feet, as the trade counts them", value: `${figure(measure.boardFeet)} bf` }]
          : []),
        { label: "Surface measure, rounded", value: `${measure.surfaceMeasureFt2} ft²` },
        { label: "One board before rounding", value: `${figure(answer.eachFt2)} ft²` },
        ...(answer.isTapered
          ? [
              {
                label: "Tallied by the width a third from the narrow end",
                value: <LengthText mm={answer.tallyWidthMm} />,
              },
            ]
          : []),
        { label: "Length counted", value: `${figure(answer.countedFeet)} ft` },
        { label: "Board feet, nothing rounded", value: `${measure.unroundedBoardFeet.toFixed(2)} bf` },
        { label: "Bundle (end) tally", value: `${bundle.widthIn} in of width, ${figure(bundle.boardFeet)} bf` },
        {
          label: `Wood that is there, ${thickness} thickness`,
          value: `${answer.trueBoardFeet.toFixed(2)} bf, ${measure.volumeM3.toFixed(4)} m³`,
        },
      ]}
      beyond={answer.beyond}
    />
  );
}

const figure = (value: number) => String(Math.round(value * 100) / 100);

const drawnLength = 1000;

/** The board from above, to scale: a line at every foot counted, the length that is dropped left pale, and the width it is tallied by. */
function PlanDrawing({ answer: { board, tallyWidthMm, isTapered, countedFeet } }: { answer: MeasureAnswer }) {
  const near = board.widthMm;
  const far = board.widthFarMm ?? near;
  const scale = drawnLength / board.lengthMm;
  const height = Math.max(near, far) * scale;
  const half = (widthMm: number) => (widthMm * scale) / 2;
  const middle = height / 2 + 4;
  const edgeAt = (x: number) => half(near + ((far - near) * x) / drawnLength);
  const counted = Math.min(drawnLength, countedFeet * mmPerFoot * scale);
  const third = near <= far ? drawnLength / 3 : (drawnLength * 2) / 3;
  const upTo = (x: number) =>
    `M4 ${middle - half(near)}L${x + 4} ${middle - edgeAt(x)}V${middle + edgeAt(x)}L4 ${middle + half(near)}Z`;
  const feet = Array.from({ length: Math.floor(countedFeet) }, (_, i) => (i + 1) * mmPerFoot * scale).filter(
    (x) => x < drawnLength - 1,
  );
  return (
    <svg
      viewBox={`0 0 ${drawnLength + 8} ${height + 8}`}
      className="block h-auto max-h-64 w-full"
      role="img"
      aria-label={`The board from above, ${Math.floor(countedFeet)} feet counted`}
    >
      <path
        d={upTo(drawnLength)}
        fill="#e2c79b"
        fillOpacity="0.35"
        stroke="#5b4a33"
        strokeWidth="2"
        strokeDasharray="10 7"
      />
      <path d={upTo(counted)} fill="#e2c79b" stroke="#5b4a33" strokeWidth="3" />
      {feet.map((x) => (
        <path
          key={x}
          d={`M${x + 4} ${middle - edgeAt(x)}V${middle + edgeAt(x)}`}
          stroke="#5b4a33"
          strokeWidth="1.5"
          opacity="0.6"
        />
      ))}
      {isTapered ? (
        <path
          d={`M${third + 4} ${middle - half(tallyWidthMm)}V${middle + half(tallyWidthMm)}`}
          stroke="#1d4ed8"
          strokeWidth="6"
          strokeDasharray="16 8"
        />
      ) : null}
    </svg>
  );
}
