import { PageHead } from "#app/components/card.tsx";
import { CalculatorList } from "#app/domain/calculators/calculator-list.tsx";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/list.ts";

export function loader({ context }: Route.LoaderArgs) {
  requireRole(context, "board:see");
  return {};
}

export default function Calculators() {
  return (
    <>
      <PageHead
        title="Calculators"
        lead="What if: no record needed, nothing kept. The figures are in the address, so a page can be saved or sent."
      />
      <CalculatorList />
    </>
  );
}
