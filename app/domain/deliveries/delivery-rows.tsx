import { href, Link } from "react-router";
import { printDay } from "#app/components/when.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { speciesName, speciesTints } from "#app/domain/species/species-tints.ts";
import type { DeliverySummary } from "./delivery.ts";
import { printVolume } from "./delivery-cost.ts";

/** Deliveries one under another; the whole row opens one. Those still to tally say so. */
export function DeliveryRows({ deliveries }: { deliveries: DeliverySummary[] }) {
  return (
    <ul className="divide-y divide-line overflow-hidden rounded-xl border border-line bg-surface">
      {deliveries.map((delivery) => (
        <li key={delivery.id}>
          <Link
            to={href("/deliveries/:deliveryId", { deliveryId: delivery.id })}
            className="grid items-center gap-x-5 gap-y-1 px-4 py-3 text-ink no-underline hover:bg-sunk sm:grid-cols-[1rem_minmax(0,1.3fr)_minmax(0,1.2fr)_auto]"
          >
            <span
              aria-hidden="true"
              className="hidden h-10 rounded-sm border border-line-strong sm:block"
              style={{ backgroundColor: speciesTints(delivery.species).base }}
            />
            <span className="min-w-0">
              <span className="block truncate font-semibold text-lg">{delivery.supplierName}</span>
              <span className="text-ink-soft">
                {[printDay(delivery.receivedOn), delivery.reference].filter(Boolean).join(" · ")}
              </span>
            </span>
            <span className="min-w-0">
              <span className="block">
                {printQuarters(delivery.quarters)} {speciesName(delivery.species)}
              </span>
              <span className="text-ink-soft">
                {[
                  delivery.grade,
                  delivery.claimedVolume === null
                    ? null
                    : `${printVolume(delivery.claimedVolume, delivery.claimedUnit)} claimed`,
                ]
                  .filter(Boolean)
                  .join(" · ")}
              </span>
            </span>
            <span className="sm:text-right">
              {delivery.talliedAt ? (
                `${delivery.boards} ${delivery.boards === 1 ? "board" : "boards"}`
              ) : (
                <span className="rounded bg-caution-ground px-2 py-0.5 font-semibold text-caution">still to tally</span>
              )}
            </span>
          </Link>
        </li>
      ))}
    </ul>
  );
}
