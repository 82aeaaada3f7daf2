import { Card } from "#app/components/card.tsx";
import { Facts } from "#app/components/facts.tsx";
import { Notice } from "#app/components/notice.tsx";
import { printDay } from "#app/components/when.tsx";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { sourceName, speciesByCode } from "#app/core/species/species.ts";
import { printMoney } from "#app/domain/shop/money.ts";
import { useShop } from "#app/domain/shop/shop-view.tsx";
import { speciesName } from "#app/domain/species/species-tints.ts";
import type { Delivery, Drying, PriceBasis } from "./delivery.ts";
import { printVolume } from "./delivery-cost.ts";

const dryingWords: Record<Drying, string> = { kiln: "kiln-dried", air: "air-dried", green: "green" };
const basisWords: Record<PriceBasis, string> = { bf: " a board foot", m3: " a cubic metre", lump: " for the lot" };

interface DeliveryFactsProps {
  delivery: Delivery;
  /** Price and freight together; null while it cannot be known. */
  totalMinor: number | null;
  children?: React.ReactNode;
}

/** The record of a delivery, as on its papers. */
export function DeliveryFacts({ delivery, totalMinor, children }: DeliveryFactsProps) {
  const { currency } = useShop();
  const { claimedVolume, claimedUnit, priceMinor, priceBasis, freightMinor } = delivery;
  return (
    <>
      <Card title="Papers">
        <Facts
          rows={[
            { label: "Supplier", value: delivery.supplierName },
            { label: "Received", value: printDay(delivery.receivedOn) },
            { label: "Their reference", value: delivery.reference || "none" },
            { label: "Wood", value: `${printQuarters(delivery.quarters)} ${speciesName(delivery.species)}` },
            { label: "Drying", value: dryingWords[delivery.drying] },
            { label: "Grade, as bought", value: delivery.grade || "not recorded" },
            { label: "Claimed", value: claimedVolume === null ? "nothing" : printVolume(claimedVolume, claimedUnit) },
            { label: "Origin", value: delivery.origin || "not recorded" },
            { label: "Certificate", value: delivery.certificate || "none" },
          ]}
        />
        <TradeCaution species={delivery.species} />
        {delivery.notes ? <p className="mt-3 whitespace-pre-line break-words">{delivery.notes}</p> : null}
      </Card>
      <Card title="Cost">
        <Facts
          rows={[
            {
              label: "Price",
              value: priceMinor === null ? "not given" : `${printMoney(priceMinor, currency)}${basisWords[priceBasis]}`,
            },
            { label: "Freight", value: printMoney(freightMinor, currency) },
            { label: "In all", value: totalMinor === null ? "not known yet" : printMoney(totalMinor, currency) },
          ]}
        />
        {children}
      </Card>
    </>
  );
}

/** Beside the papers of a species whose trade is controlled: what to keep, and where that comes from. */
function TradeCaution({ species }: { species: string }) {
  const trade = speciesByCode(species)?.trade;
  if (!trade) return null;
  const listed = trade.appendix === "check" ? "may be controlled" : `is controlled, Appendix ${trade.appendix}`;
  return (
    <Notice kind="caution" className="mt-3" title={`Trade in ${speciesName(species)} ${listed} (CITES)`}>
      {trade.words} <span className="text-ink-soft text-sm">{sourceName(trade.source)}.</span>
    </Notice>
  );
}
