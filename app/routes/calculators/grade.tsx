import { CalculatorPage } from "#app/domain/calculators/calculator-page.tsx";
import { calculators } from "#app/domain/calculators/calculators.ts";
import { askGrade, gradeFormula, gradeSources } from "#app/domain/calculators/grade.ts";
import { Box, LinesBox } from "#app/domain/calculators/inputs.tsx";
import { GradeFigures } from "#app/domain/grade/grade-figures.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/grade.ts";

export function loader({ context, url }: Route.LoaderArgs) {
  return askGrade(url.searchParams, requireRole(context, "board:see").shop);
}

export default function GradePage({ loaderData: asked }: Route.ComponentProps) {
  const { units } = useShop();
  const hint = "One a line: from the near end, from the left edge, long, wide.";
  return (
    <CalculatorPage
      calculator={calculators.grade}
      asked={asked}
      formula={gradeFormula}
      sources={gradeSources}
      result={(answer) => <GradeFigures board={answer} graded={answer.graded} />}
    >
      <div className="grid grid-cols-2 gap-3">
        <Box asked={asked} name="width" label="Width" unit={units} />
        <Box asked={asked} name="length" label="Length" unit={units} />
      </div>
      <LinesBox asked={asked} name="heart" label="Defects on the heart face" hint={hint} />
      <LinesBox asked={asked} name="bark" label="Defects on the bark face" hint={hint} />
    </CalculatorPage>
  );
}
