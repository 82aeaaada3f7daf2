import { Card } from "#app/components/card.tsx";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import type { BoardWeight } from "./board-weight.ts";
import { LiftingCaution } from "./lifting-caution.tsx";
import { printMass } from "./mass-text.ts";

/** What the board weighs, for whoever lifts it. */
export function WeightCard({ weight }: { weight: BoardWeight | null }) {
  const { units } = useShop();
  if (!weight)
    return (
      <Card title="Weight">
        <p className="text-ink-soft">Not known: no specific gravity for this wood at this moisture.</p>
      </Card>
    );
  return (
    <Card title="Weight">
      <p className="font-display font-semibold text-2xl">about {printMass(weight.massKg, units)}</p>
      <p className="mt-1 text-ink-soft">
        At {weight.moisturePct.toFixed(1)} % moisture
        {weight.isMoistureAssumed ? ", assumed, as it was not metered" : ""}: Wood Handbook Eq. 4-11 and 4-14, measured
        sizes. Single boards stray 10 % and more.
      </p>
      <LiftingCaution massKg={weight.massKg} />
    </Card>
  );
}
