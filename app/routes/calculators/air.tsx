import { airFormula, airSources, askAir } from "#app/domain/calculators/air.ts";
import { AirResult } from "#app/domain/calculators/air-result.tsx";
import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { NumberBox } from "#app/domain/calculators/inputs.tsx";
import { temperatureUnit } from "#app/domain/moisture/temperature.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/air.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askAir(url.searchParams, requireRole(context, "board:see").shop);
}

export default function AirPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.air}
      asked={asked}
      formula={airFormula(units)}
      sources={airSources}
      result={(answer) => <AirResult answer={answer} />}
    >
      <NumberBox asked={asked} name="temperature" label="Temperature of the air" unit={temperatureUnit(units)} />
      <NumberBox
        asked={asked}
        name="humidity"
        label="Relative humidity"
        unit="%"
        hint="What does this air do to wood?"
      />
      <NumberBox
        asked={asked}
        name="moisture"
        label="Or moisture of the wood"
        unit="%"
        hint="What air does this moisture mean?"
      />
    </CalculatorPage>
  );
}
