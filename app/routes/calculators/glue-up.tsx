import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { askGlueUp, glueUpFormula, glueUpSources } from "#app/domain/calculators/glue-up.ts";
import { GlueUpResult } from "#app/domain/calculators/glue-up-result.tsx";
import { Box, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/glue-up.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askGlueUp(url.searchParams, requireRole(context, "board:see").shop);
}

export default function GlueUpPage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.glueUp}
      asked={asked}
      formula={glueUpFormula}
      sources={glueUpSources}
      result={(answer) => <GlueUpResult answer={answer} />}
    >
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="finished" label="Finished thickness" unit={units} />
        <Box asked={asked} name="stock" label="Stock, measured" unit={units} />
        <Box asked={asked} name="joint" label="Jointing, a face" unit={units} />
        <Box asked={asked} name="allowance" label="Left for squaring" unit={units} />
        <Box asked={asked} name="width" label="Blank's width" unit={units} />
        <Box asked={asked} name="length" label="Blank's length" unit={units} />
        <NumberBox asked={asked} name="fromTop" label="Taken from the top" unit="%" hint="50: from both alike." />
        <NumberBox asked={asked} name="pressure" label="Pressure" unit="psi" />
        <NumberBox asked={asked} name="force" label="Force of a clamp" unit={units === "in" ? "lbf" : "kN"} />
        <Box asked={asked} name="caul" label="Caul" unit={units} hint="Under the pad." />
        <NumberBox asked={asked} name="blanks" label="Blanks alike" />
        <NumberBox asked={asked} name="clamps" label="Clamps owned" />
        <NumberBox asked={asked} name="minutes" label="In clamps" unit="min" />
      </div>
    </CalculatorPage>
  );
}
