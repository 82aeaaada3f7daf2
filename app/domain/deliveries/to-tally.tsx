import { href } from "react-router";
import { ButtonLink } from "#app/components/button.tsx";
import { Card } from "#app/components/card.tsx";
import type { Delivery } from "./delivery.ts";
import { printVolume } from "./delivery-cost.ts";

interface ToTallyProps {
  delivery: Delivery;
  /** Rows of a tally that was begun. */
  draftRows: number;
  mayTally: boolean;
}

/** The next step of a delivery that has no boards yet. */
export function ToTally({ delivery, draftRows, mayTally }: ToTallyProps) {
  const claimed =
    delivery.claimedVolume === null
      ? "The papers claim no volume; the tally says what came."
      : `The papers claim ${printVolume(delivery.claimedVolume, delivery.claimedUnit)}.`;
  return (
    <Card title="Still to tally" className="grid justify-items-start gap-3">
      <p className="max-w-prose">
        {claimed} Measure every board at the tailgate: width and length, Enter, next. Saved, each board gets its tag.
      </p>
      {mayTally ? (
        <ButtonLink
          look="main"
          to={href("/deliveries/:deliveryId/tally", { deliveryId: delivery.id })}
          className="w-full sm:w-auto"
        >
          {draftRows > 0 ? `Go on with the tally (${draftRows} ${draftRows === 1 ? "row" : "rows"})` : "Tally it"}
        </ButtonLink>
      ) : null}
    </Card>
  );
}
