import { Form, href } from "react-router";
import { Button } from "#app/components/button.tsx";
import { Card } from "#app/components/card.tsx";
import { SelectField } from "#app/components/field.tsx";
import { Beyond } from "#app/components/figures.tsx";
import { When } from "#app/components/when.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { BoardReadiness } from "./board-readiness.ts";
import type { MoistureReading } from "./moisture.sql.server.ts";
import { PlaceOptions } from "./place-options.tsx";
import { ReadyPlot } from "./ready-plot.tsx";
import { readyWords } from "./ready-words.ts";
import { printTemperature } from "./temperature.ts";

interface MoistureCardProps {
  boardId: string;
  readings: MoistureReading[];
  /** Null before the first reading. */
  readiness: BoardReadiness | null;
}

/** When the board will be ready for where its piece will live, from its own readings; then each reading in words. */
export function MoistureCard({ boardId, readings, readiness }: MoistureCardProps) {
  return (
    <Card
      title="Moisture"
      aside={readings.length > 0 ? `${readings.length} ${readings.length === 1 ? "reading" : "readings"}` : null}
    >
      {readiness ? (
        <Readiness boardId={boardId} readiness={readiness} />
      ) : (
        <p className="text-ink-soft">Not metered yet. Three readings on different days tell when it will be ready.</p>
      )}
      <ul className="mt-4 grid gap-1.5">
        {readings
          .toReversed()
          .slice(0, 6)
          .map((reading) => (
            <li key={reading.id} className="flex flex-wrap justify-between gap-x-4">
              <ReadingWords reading={reading} />
              <span className="text-ink-soft">
                {reading.readBy}, <When at={reading.readAt} />
              </span>
            </li>
          ))}
      </ul>
    </Card>
  );
}

function Readiness({ boardId, readiness }: { boardId: string; readiness: BoardReadiness }) {
  const { view, place } = readiness;
  const words = readyWords(view);
  const { target } = place;
  return (
    <>
      <p className="text-ink-soft">For {place.words}</p>
      <p className="font-display font-semibold text-2xl">{words.headline}</p>
      {words.detail ? <p className="mb-3">{words.detail}</p> : null}
      <ReadyPlot view={view} today={readiness.today} />
      <Beyond says={[...words.cautions, target.outsideRange, readiness.newestOutside]} />
      <p className="mt-2 text-ink-soft">
        Target {target.targetPct.toFixed(1)} % ± {target.tolerancePct}. {place.targetSource} This shop's air holds wood
        at {view.emcPct.toFixed(1)} %; the curve is our own model of drying, fitted to these readings.
      </p>
      <Form
        method="get"
        action={href("/boards/:boardId", { boardId })}
        preventScrollReset
        className="mt-3 flex flex-wrap items-end gap-2"
        data-screen-only
      >
        <SelectField
          key={place.name}
          id="place"
          label="Where the piece will live"
          name="place"
          defaultValue={place.name}
          className="min-w-60 flex-1"
        >
          <PlaceOptions />
        </SelectField>
        <Button>Show</Button>
      </Form>
    </>
  );
}

function ReadingWords({ reading }: { reading: MoistureReading }) {
  const { units } = useShop();
  const wood =
    reading.woodTemperatureC === null ? null : `wood at ${printTemperature(reading.woodTemperatureC, units)}`;
  const isCorrected = reading.moisturePct !== reading.meterPct;
  const raw = isCorrected ? `the meter said ${reading.meterPct.toFixed(1)} %` : null;
  const words = [raw, wood].filter((part) => part !== null).join(", ");
  return (
    <span>
      <strong className="font-mono">{reading.moisturePct.toFixed(1)} %</strong> {reading.meter}
      {reading.place ? `, ${reading.place}` : ""}
      {words ? <span className="text-ink-soft"> ({words})</span> : null}
    </span>
  );
}
