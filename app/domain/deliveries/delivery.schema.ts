import { z } from "zod";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { isSpeciesCode } from "#app/core/species/species.ts";
import { dayField } from "#app/domain/shop/day-field.ts";
import { moneyField } from "#app/domain/shop/money.ts";
import { dryings, priceBases } from "./delivery.ts";

const words = (max: number) => z.string().trim().max(max, `At most ${max} characters.`).default("");

/** A delivery as typed from the supplier's papers. The supplier is one of the shop's, or a new name, which counts before the choice. */
export function deliveryForm(shop: { currency: string }) {
  return z
    .object({
      supplierId: z.string().regex(identifier).or(z.literal("")).default(""),
      newSupplier: words(120),
      receivedOn: dayField("When did it come?"),
      reference: words(80),
      species: z.string({ error: "Choose the species." }).refine(isSpeciesCode, "Choose the species."),
      quarters: z.coerce.number({ error: "Choose the quarters." }).int().min(1).max(40),
      drying: z.enum(dryings).default("kiln"),
      grade: words(40),
      claimedVolume: z.coerce
        .number({ error: "A number, such as 212 or 0.5." })
        .min(0.001, "More than nothing.")
        .max(1_000_000, "That cannot be.")
        .nullable()
        .default(null),
      claimedUnit: z.enum(["bf", "m3"]).default("bf"),
      priceMinor: moneyField(shop.currency),
      priceBasis: z.enum(priceBases).default("bf"),
      freightMinor: moneyField(shop.currency).transform((minor) => minor ?? 0),
      origin: words(120),
      certificate: words(120),
      notes: words(4000),
    })
    .refine((form) => form.supplierId !== "" || form.newSupplier !== "", {
      path: ["newSupplier"],
      error: "Choose the supplier, or name a new one.",
      // Said together with whatever else is wrong.
      when: ({ value }) => typeof value === "object" && value !== null,
    });
}

export type DeliveryForm = z.infer<ReturnType<typeof deliveryForm>>;
