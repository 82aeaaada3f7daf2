import type { Knex } from "knex";
import { insertDelivery } from "#app/domain/deliveries/deliveries.sql.server.ts";
import { type DeliveryForm, deliveryForm } from "#app/domain/deliveries/delivery.schema.ts";
import { supplierNamed } from "#app/domain/deliveries/suppliers.sql.server.ts";
import type { TallyLine } from "#app/domain/deliveries/tally.ts";
import type { Actor } from "#app/domain/shop/actor.ts";

/** What somebody types of a delivery: 4/4 white oak, 200 bf at 8.75 and 50.00 freight. */
export const deliveryFields = {
  newSupplier: "Kestrel Mill",
  receivedOn: "2027-03-01",
  species: "white-oak",
  quarters: "4",
  claimedVolume: "200",
  priceMinor: "8.75",
  freightMinor: "50",
};

/** A delivery as parsed from its form. */
export function aDeliveryForm(given: Partial<DeliveryForm> = {}): DeliveryForm {
  return { ...deliveryForm({ currency: "USD" }).parse(deliveryFields), ...given };
}

/** A delivery that waits for its tally. */
export async function aDelivery(
  db: Knex,
  actor: Actor,
  given: Partial<DeliveryForm> = {},
): Promise<{ id: string; version: number }> {
  const form = aDeliveryForm(given);
  const supplierId = form.supplierId || (await supplierNamed(db, actor, form.newSupplier));
  return { id: await insertDelivery(db, actor, form, supplierId), version: 1 };
}

/** Boards of 8 in by 8 ft, 4/4 white oak. */
export function aTallyLine(given: Partial<TallyLine> = {}): TallyLine {
  return { count: 1, widthMm: 203.2, lengthMm: 2438.4, quarters: 4, species: "white-oak", ...given };
}
