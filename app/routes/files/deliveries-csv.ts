import { type CsvValue, csvLine } from "#app/core/csv/print-csv.ts";
import { printQuarters } from "#app/core/lengths/quarters.ts";
import { summaries } from "#app/domain/deliveries/deliveries.sql.server.ts";
import type { DeliverySummary } from "#app/domain/deliveries/delivery.ts";
import { readDeliveryFilter } from "#app/domain/deliveries/delivery-filter.ts";
import { moneyInput } from "#app/domain/shop/money.ts";
import { speciesName } from "#app/domain/species/species-tints.ts";
import { dbContext } from "#app/server/context.server.ts";
import { requireRole } from "#app/server/guards.server.ts";
import type { Route } from "./+types/deliveries-csv.ts";

const block = 1_000;

/** The list as it is filtered and sorted, all of its pages, as CSV. */
export function loader({ context, url }: Route.LoaderArgs) {
  const { actor, shop } = requireRole(context, "delivery:see");
  const db = context.get(dbContext);
  const filter = readDeliveryFilter(url.searchParams);
  const encoder = new TextEncoder();
  let offset = 0;
  const body = new ReadableStream<Uint8Array>({
    start: (controller) => controller.enqueue(encoder.encode(csvLine(heading(shop.currency)))),
    async pull(controller) {
      const deliveries = await summaries(db, actor, filter, block, offset);
      offset += block;
      const text = deliveries.map((delivery) => csvLine(line(delivery, shop.currency))).join("");
      if (text) controller.enqueue(encoder.encode(text));
      if (deliveries.length < block) controller.close();
    },
  });
  return new Response(body, {
    headers: {
      "Content-Type": "text/csv; charset=utf-8",
      "Content-Disposition": 'attachment; filename="deliveries.csv"',
    },
  });
}

function heading(currency: string): string[] {
  return [
    "received",
    "supplier",
    "reference",
    "species",
    "quarters",
    "drying",
    "grade",
    "claimed",
    "unit",
    `price (${currency})`,
    "per",
    `freight (${currency})`,
    "origin",
    "certificate",
    "boards",
    "tallied",
  ];
}

function line(delivery: DeliverySummary, currency: string): CsvValue[] {
  return [
    delivery.receivedOn,
    delivery.supplierName,
    delivery.reference,
    speciesName(delivery.species),
    printQuarters(delivery.quarters),
    delivery.drying,
    delivery.grade,
    delivery.claimedVolume,
    delivery.claimedVolume === null ? "" : delivery.claimedUnit,
    moneyInput(delivery.priceMinor, currency),
    delivery.priceMinor === null ? "" : delivery.priceBasis,
    moneyInput(delivery.freightMinor, currency),
    delivery.origin,
    delivery.certificate,
    delivery.boards,
    delivery.talliedAt ? delivery.talliedAt.toISOString().slice(0, 10) : "",
  ];
}
