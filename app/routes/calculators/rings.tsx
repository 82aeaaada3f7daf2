import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { Box, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { RingInputs } from "#app/domain/calculators/ring-inputs.tsx";
import { askRings, ringsFormula, ringsSources } from "#app/domain/calculators/rings.ts";
import { RingsResult } from "#app/domain/calculators/rings-result.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/rings.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askRings(url.searchParams, requireRole(context, "board:see").shop);
}

export default function RingsPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.rings}
      asked={asked}
      formula={ringsFormula}
      sources={ringsSources}
      result={(answer) => <RingsResult answer={answer} />}
    >
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="width" label="Width" unit={units} />
        <Box asked={asked} name="thickness" label="Thickness" unit={units} />
      </div>
      <RingInputs asked={asked} />
      <fieldset className="grid grid-cols-2 gap-3 rounded-lg border border-line p-3">
        <legend className="px-1 font-semibold">A strip from it</legend>
        <Box asked={asked} name="strip" label="Strip's width" unit={units} hint="Empty: none." />
        <NumberBox asked={asked} name="share" label="In the window" unit="%" hint="Of its area." />
        <NumberBox asked={asked} name="least" label="Rings from" unit="°" />
        <NumberBox asked={asked} name="greatest" label="to" unit="°" />
      </fieldset>
    </CalculatorPage>
  );
}
