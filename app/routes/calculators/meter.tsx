import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Choice, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { askMeter, meterFormula, meterSources } from "#app/domain/calculators/meter.ts";
import { MeterResult } from "#app/domain/calculators/meter-result.tsx";
import { temperatureUnit } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/meter.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askMeter(url.searchParams, requireRole(context, "board:see").shop);
}

export default function MeterPage({ loaderData: asked }: Route.ComponentProps) {
  const degrees = temperatureUnit(useShop().units);
  return (
    <CalculatorPage
      calculator={calculators.meter}
      asked={asked}
      formula={meterFormula}
      sources={meterSources}
      result={(answer) => <MeterResult answer={answer} />}
    >
      <NumberBox asked={asked} name="reading" label="Meter says" unit="%" />
      <Choice asked={asked} name="meter" label="Meter">
        <option value="pin">pins</option>
        <option value="pinless">pinless</option>
        <option value="oven">oven-dry sample</option>
      </Choice>
      <NumberBox
        asked={asked}
        name="wood"
        label="Temperature of the wood"
        unit={degrees}
        hint="The wood's, not the air's. Empty: not taken."
      />
      <NumberBox
        asked={asked}
        name="calibration"
        label="Meter is calibrated for"
        unit={degrees}
        hint="70 °F (21 °C) unless its maker says otherwise."
      />
    </CalculatorPage>
  );
}
