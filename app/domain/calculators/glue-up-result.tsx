import { CautionList } from "#app/components/caution-list.tsx";
import { Figures } from "#app/components/figures.tsx";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import type { GlueUpAnswer } from "./glue-up.ts";

/** How many plies, where the glue lines end up, how many clamps, how much glue, and what comes out of clamps when. */
export function GlueUpResult({ answer }: { answer: GlueUpAnswer }) {
  const { plies, lines, clamps, glue, batches } = answer;
  return (
    <>
      <Figures
        title="Plies"
        main={{ label: "It takes", value: plies.plies === 1 ? "one ply, no glue" : `${plies.plies} plies` }}
        drawing={<BlankDrawing answer={answer} />}
        rows={[
          { label: "Out of the clamps", value: <LengthText mm={plies.gluedMm} /> },
          { label: "An outer ply, jointed", value: <LengthText mm={plies.outerPlyMm} /> },
          ...(plies.innerPlyMm === null
            ? []
            : [{ label: "An inner ply, both faces jointed", value: <LengthText mm={plies.innerPlyMm} /> }]),
          { label: "Left to take off", value: <LengthText mm={plies.toTakeOffMm} /> },
          ...lines.map((line, index) => ({
            label: lines.length === 1 ? "The glue line lies" : `Glue line ${index + 1} lies`,
            value: (
              <>
                <LengthText mm={line.atMm} /> from the top, <OffMiddle mm={line.offMiddleMm} />
              </>
            ),
          })),
          { label: "Of the stock's thickness, in the part", value: `${Math.round(plies.yield * 100)} %` },
        ]}
      >
        <CautionList cautions={answer.cautions} />
      </Figures>
      {clamps ? (
        <Figures
          title="Clamps and glue, one blank"
          main={{
            label: clamps.decidedBy === "force" ? "For the pressure" : "To reach every place",
            value: `${clamps.clamps} ${clamps.clamps === 1 ? "clamp" : "clamps"}`,
          }}
          rows={[
            { label: "One every", value: <LengthText mm={clamps.spacingMm} /> },
            {
              label: "Force over the joint",
              value: `${Math.round(clamps.forceN / 4.448).toLocaleString("en")} lbf, ${(clamps.forceN / 1000).toFixed(1)} kN`,
            },
            { label: "Glue", value: `${Math.round(glue.low)} to ${Math.round(glue.high)} g` },
          ]}
        >
          <p className="mt-3 text-ink-soft">
            Fit it dry first; enough force for a thin, even squeeze-out is enough. The glue's own label says its open
            time, its cold limit and its clamp time.
          </p>
        </Figures>
      ) : null}
      {answer.tooMany ? (
        <Figures title="Batches">
          One blank takes more clamps than there are: borrow some, or glue it a ply at a time.
        </Figures>
      ) : null}
      {batches.length > 0 ? (
        <Figures
          title={`${batches.length} ${batches.length === 1 ? "batch" : "batches"}`}
          rows={batches.map((batch, index) => ({
            label: `Batch ${index + 1}: ${batch.ids.length} ${batch.ids.length === 1 ? "blank" : "blanks"}, ${batch.clamps} clamps`,
            value: `in at ${clock(batch.startsMinute)}, out at ${clock(batch.outMinute)}`,
          }))}
        />
      ) : null}
    </>
  );
}

function OffMiddle({ mm }: { mm: number }) {
  if (Math.abs(mm) < 0.05) return "in the middle";
  return (
    <>
      <LengthText mm={Math.abs(mm)} /> {mm < 0 ? "above" : "below"} the middle
    </>
  );
}

/** Hours and minutes from the start. */
function clock(minutes: number): string {
  return `${Math.floor(minutes / 60)}:${String(Math.round(minutes % 60)).padStart(2, "0")}`;
}

/** The blank from its end: plies as glued, and dashed the finished thickness in it. */
function BlankDrawing({ answer }: { answer: GlueUpAnswer }) {
  const scale = 150 / answer.plies.gluedMm;
  let y = 0;
  return (
    <svg
      viewBox="0 0 320 160"
      className="w-full max-w-md"
      role="img"
      aria-label={`${answer.plies.plies} plies with the finished part drawn in them`}
    >
      {answer.pliesMm.map((ply) => {
        const top = y;
        y += ply * scale;
        return (
          <rect
            key={top}
            x="20"
            y={5 + top}
            width="280"
            height={ply * scale}
            fill="#d9b98a"
            stroke="#5b4a33"
            strokeWidth="1.5"
          />
        );
      })}
      <rect
        x="30"
        y={5 + answer.takenTopMm * scale}
        width="260"
        height={answer.finishedMm * scale}
        fill="none"
        stroke="#1d4ed8"
        strokeWidth="2.5"
        strokeDasharray="8 5"
      />
    </svg>
  );
}
