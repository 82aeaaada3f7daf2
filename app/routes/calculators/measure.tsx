import { QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, Choice, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { askMeasure, measureFormula, measureSources } from "#app/domain/calculators/measure.ts";
import { MeasureResult } from "#app/domain/calculators/measure-result.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/measure.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askMeasure(url.searchParams, requireRole(context, "board:see").shop);
}

export default function MeasurePage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.measure}
      asked={asked}
      formula={measureFormula}
      sources={measureSources}
      result={(answer) => <MeasureResult answer={answer} />}
    >
      <Choice asked={asked} name="quarters" label="Thickness, nominal">
        <QuartersOptions />
      </Choice>
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="width" label="Width" unit={units} />
        <Box asked={asked} name="widthFar" label="Far end" unit={units} hint="Empty: one width." />
        <Box asked={asked} name="length" label="Length" unit={units} />
        <NumberBox asked={asked} name="count" label="Boards alike" />
      </div>
      <Box asked={asked} name="thickness" label="Thickness, measured" unit={units} hint="Empty: the nominal one." />
      <Choice asked={asked} name="lengths" label="Lengths count">
        <option value="whole">down to whole feet, as the trade does</option>
        <option value="measured">as measured</option>
      </Choice>
    </CalculatorPage>
  );
}
