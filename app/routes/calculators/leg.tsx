import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { askLeg, legFormula, legSources } from "#app/domain/calculators/leg.ts";
import { LegResult } from "#app/domain/calculators/leg-result.tsx";
import { RingInputs } from "#app/domain/calculators/ring-inputs.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/leg.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askLeg(url.searchParams, requireRole(context, "board:see").shop);
}

export default function LegPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.leg}
      asked={asked}
      formula={legFormula}
      sources={legSources}
      result={(answer) => <LegResult answer={answer} />}
    >
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="width" label="Board's width" unit={units} />
        <Box asked={asked} name="thickness" label="Thickness" unit={units} />
        <Box asked={asked} name="legWidth" label="Leg's width" unit={units} />
        <Box asked={asked} name="legThickness" label="Thickness" unit={units} />
        <Box asked={asked} name="middle" label="Leg from left" unit={units} hint="To its middle." />
        <NumberBox asked={asked} name="straight" label="Straight from" unit="°" hint="Rings to a side." />
      </div>
      <RingInputs asked={asked} />
    </CalculatorPage>
  );
}
