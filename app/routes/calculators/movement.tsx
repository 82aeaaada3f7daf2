import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, Choice, NumberBox, SpeciesChoice } from "#app/domain/calculators/inputs.tsx";
import { askMovement, movementFormula, movementSources } from "#app/domain/calculators/movement.ts";
import { MovementResult } from "#app/domain/calculators/movement-result.tsx";
import { RingInputs } from "#app/domain/calculators/ring-inputs.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/movement.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askMovement(url.searchParams, requireRole(context, "board:see").shop);
}

export default function MovementPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.movement}
      asked={asked}
      formula={movementFormula}
      sources={movementSources}
      result={(answer) => <MovementResult answer={answer} />}
    >
      <SpeciesChoice asked={asked} name="species" />
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="width" label="Width" unit={units} />
        <Box asked={asked} name="thickness" label="Thickness" unit={units} />
        <NumberBox asked={asked} name="from" label="Moisture now" unit="%" />
        <NumberBox asked={asked} name="to" label="Moisture later" unit="%" />
      </div>
      <RingInputs asked={asked} />
      <Choice asked={asked} name="basis" label="By the table of">
        <option value="coefficient-table">change per point (13-5), for wood in use</option>
        <option value="shrinkage-table">shrinkage from green (4-3, 4-4)</option>
      </Choice>
    </CalculatorPage>
  );
}
