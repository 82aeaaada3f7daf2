import { Figures } from "#app/components/figures.tsx";
import { ReadyPlot } from "#app/domain/moisture/ready-plot.tsx";
import { readyWords } from "#app/domain/moisture/ready-words.ts";
import type { ReadyAnswer } from "./ready.ts";

/** The day, its range on the plot, and what is not known said as such. */
export function ReadyResult({ answer }: { answer: ReadyAnswer }) {
  const { view, targetPct, tolerancePct } = answer;
  const words = readyWords(view);
  const last = view.readings.at(-1);
  return (
    <Figures
      title="When it will be ready"
      main={{ label: `For ${answer.targetWords}`, value: words.headline }}
      drawing={<ReadyPlot view={view} />}
      rows={[
        { label: "Target", value: `${targetPct.toFixed(1)} % ± ${tolerancePct}` },
        { label: "This air holds wood at", value: `${view.emcPct.toFixed(1)} %` },
        ...(last ? [{ label: "Last reading", value: `${last.moisturePct} %` }] : []),
      ]}
      beyond={[answer.outsideRange, ...words.cautions]}
    >
      {words.detail ? <p className="mt-3">{words.detail}</p> : null}
      <p className="mt-2 text-ink-soft">{answer.targetSource}</p>
    </Figures>
  );
}
