import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Choice, LinesBox, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { askReady, readyFormula, readySources } from "#app/domain/calculators/ready.ts";
import { ReadyResult } from "#app/domain/calculators/ready-result.tsx";
import { PlaceOptions } from "#app/domain/moisture/place-options.tsx";
import { temperatureUnit } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/ready.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askReady(url.searchParams, requireRole(context, "board:see").shop);
}

export default function ReadyPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.ready}
      asked={asked}
      formula={readyFormula}
      sources={readySources}
      result={(answer) => <ReadyResult answer={answer} />}
    >
      <LinesBox
        asked={asked}
        name="readings"
        label="Readings, one to a line"
        hint="A date or a day's number, then percent: 2026-11-03 12.5, or 14 12.5."
      />
      <div className="grid grid-cols-2 gap-3">
        <NumberBox asked={asked} name="temperature" label="Air" unit={temperatureUnit(units)} />
        <NumberBox asked={asked} name="humidity" label="Humidity" unit="%" />
      </div>
      <Choice asked={asked} name="place" label="Ready for">
        <PlaceOptions here="this air" />
      </Choice>
    </CalculatorPage>
  );
}
