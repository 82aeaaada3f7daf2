import { CautionList } from "#app/components/caution-list.tsx";
import { Figures } from "#app/components/figures.tsx";
import { LengthText } from "#app/domain/boards/size-text.tsx";
import type { MillingAnswer } from "./milling.ts";

/** The sheet step by step, each size with the cautions it calls for, then planer against saw. */
export function MillingResult({ answer }: { answer: MillingAnswer }) {
  const { sheet, saw, passes } = answer;
  const most = Math.max(...sheet.steps.map((step) => step.size.thicknessMm * step.pieces));
  return (
    <>
      <Figures title="Step by step">
        <ol className="grid gap-3">
          {sheet.steps.map(({ step, size, pieces }, index) => (
            <li key={step} className="grid gap-2 border-line border-b pb-3 sm:grid-cols-[11rem_minmax(0,1fr)]">
              <div>
                <p className="font-semibold">
                  {index + 1}. {step}
                </p>
                <svg viewBox="0 0 160 40" className="mt-1 h-10 w-40" aria-hidden="true">
                  {Array.from({ length: pieces }, (_, i) => i).map((i) => (
                    <rect
                      key={i}
                      x="2"
                      y={2 + i * ((36 * size.thicknessMm) / most)}
                      width={Math.min(156, (156 * size.widthMm) / (sheet.steps[0]?.size.widthMm ?? size.widthMm))}
                      height={Math.max(2, (36 * size.thicknessMm) / most - 1)}
                      fill="#d9b98a"
                      stroke="#5b4a33"
                    />
                  ))}
                </svg>
              </div>
              <div>
                <p className="font-semibold text-lg">
                  {pieces > 1 ? `${pieces} of ` : ""}
                  <LengthText mm={size.thicknessMm} unit={false} /> × <LengthText mm={size.widthMm} unit={false} /> ×{" "}
                  <LengthText mm={size.lengthMm} />
                </p>
                <CautionList cautions={answer.cautions[index] ?? []} />
              </div>
            </li>
          ))}
        </ol>
      </Figures>
      <Figures
        title="Planer against saw"
        rows={[
          { label: "To take off in all", value: <LengthText mm={sheet.plies.toTakeOffMm} /> },
          { label: "By the planer alone", value: `${passes} ${passes === 1 ? "pass" : "passes"}` },
          {
            label: "By the saw first",
            value: saw ? (
              <>
                {saw.sawPasses} saw {saw.sawPasses === 1 ? "pass" : "passes"}, <LengthText mm={saw.leftForPlanerMm} />{" "}
                left for the planer
              </>
            ) : (
              "not here: too little to saw off, or too tall for two passes"
            ),
          },
          ...(saw?.savedMm
            ? [{ label: "Comes off whole, worth keeping", value: <LengthText mm={saw.savedMm} /> }]
            : []),
        ]}
      >
        <CautionList cautions={answer.wood} />
      </Figures>
    </>
  );
}
