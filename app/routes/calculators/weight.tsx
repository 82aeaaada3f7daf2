import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, NumberBox, SpeciesChoice } from "#app/domain/calculators/inputs.tsx";
import { askWeight, weightFormula, weightSources } from "#app/domain/calculators/weight.ts";
import { WeightResult } from "#app/domain/calculators/weight-result.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { massUnit } from "#app/domain/weight/mass-text.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/weight.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askWeight(url.searchParams, requireRole(context, "board:see").shop);
}

export default function WeightPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.weight}
      asked={asked}
      formula={weightFormula}
      sources={weightSources}
      result={(answer) => <WeightResult answer={answer} />}
    >
      <SpeciesChoice asked={asked} name="species" />
      <div className="grid grid-cols-2 gap-3">
        <NumberBox asked={asked} name="moisture" label="Moisture" unit="%" />
        <Box asked={asked} name="thickness" label="Thickness" unit={units} />
        <Box asked={asked} name="width" label="Width" unit={units} />
        <Box asked={asked} name="widthFar" label="Far end" unit={units} hint="Empty: one width." />
        <Box asked={asked} name="length" label="Length" unit={units} />
        <NumberBox asked={asked} name="count" label="Boards alike" />
        <NumberBox asked={asked} name="arms" label="Arms under it" hint="Empty: none." />
        <NumberBox asked={asked} name="rating" label="One arm's rating" unit={massUnit(units)} hint="From its maker." />
      </div>
    </CalculatorPage>
  );
}
