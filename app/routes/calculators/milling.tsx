import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, SpeciesChoice } from "#app/domain/calculators/inputs.tsx";
import { askMilling, millingFormula, millingSources } from "#app/domain/calculators/milling.ts";
import { MillingResult } from "#app/domain/calculators/milling-result.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/milling.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askMilling(url.searchParams, requireRole(context, "board:see").shop);
}

export default function MillingPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.milling}
      asked={asked}
      formula={millingFormula}
      sources={millingSources}
      result={(answer) => <MillingResult answer={answer} />}
    >
      <SpeciesChoice asked={asked} name="species" />
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="thickness" label="Finished thickness" unit={units} />
        <Box asked={asked} name="width" label="Finished width" unit={units} />
        <Box asked={asked} name="length" label="Finished length" unit={units} />
        <Box asked={asked} name="stock" label="Stock, measured" unit={units} />
        <Box asked={asked} name="addLength" label="Allow in length" unit={units} />
        <Box asked={asked} name="addWidth" label="Allow in width" unit={units} />
        <Box asked={asked} name="addThickness" label="Allow in thickness" unit={units} />
        <Box asked={asked} name="joint" label="Jointing, a face" unit={units} />
        <Box asked={asked} name="pass" label="Planer, a pass" unit={units} />
        <Box asked={asked} name="blade" label="Saw cuts as high as" unit={units} />
        <Box asked={asked} name="leave" label="Leave for the planer" unit={units} />
      </div>
    </CalculatorPage>
  );
}
