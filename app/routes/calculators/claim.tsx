import { QuartersOptions } from "#app/domain/boards/quarters-options.tsx";
import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { askClaim, claimFormula, claimSources } from "#app/domain/calculators/claim.ts";
import { ClaimResult } from "#app/domain/calculators/claim-result.tsx";
import { Box, Choice, LinesBox, NumberBox } from "#app/domain/calculators/inputs.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/claim.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askClaim(url.searchParams, requireRole(context, "board:see").shop);
}

export default function ClaimPage({ loaderData: asked }: Route.ComponentProps) {
  const { units, currency } = useShop();
  return (
    <CalculatorPage
      calculator={calculators.claim}
      asked={asked}
      formula={claimFormula}
      sources={claimSources}
      result={(answer) => <ClaimResult answer={answer} />}
    >
      <LinesBox
        asked={asked}
        name="boards"
        label="Boards, one size to a line"
        hint={
          units === "in"
            ? `Width x length: 8 1/4 x 10'6", or 3 @ 8 x 10' for three alike.`
            : "Width x length: 210 x 3050, or 3 @ 200 x 3.05 for three alike."
        }
      />
      <Choice asked={asked} name="quarters" label="Thickness, nominal">
        <QuartersOptions />
      </Choice>
      <div className="grid grid-cols-2 gap-3">
        <NumberBox asked={asked} name="claimed" label="Claimed" />
        <Choice asked={asked} name="unit" label="Claimed in">
          <option value="bf">board feet</option>
          <option value="m3">m³</option>
        </Choice>
        <Choice asked={asked} name="tallied" label="Tallied">
          <option value="net">after the kiln</option>
          <option value="gross">green</option>
        </Choice>
        <NumberBox asked={asked} name="allowance" label="Kiln takes" unit="%" hint="Of a green tally." />
        <Box asked={asked} name="price" label={`Price, ${currency}`} hint="Empty: none." />
        <Choice asked={asked} name="basis" label="For">
          <option value="bf">a board foot</option>
          <option value="m3">a m³</option>
          <option value="lump">the lot</option>
        </Choice>
      </div>
    </CalculatorPage>
  );
}
