import { z } from "zod";
import { identifier } from "#app/core/identifiers/identifier.ts";

const text = (max: number) => z.string().trim().max(max).catch("");

const filterSchema = z.object({
  q: text(80),
  supplier: z.string().regex(identifier).catch(""),
  species: text(60),
  tally: z.enum(["any", "waiting", "done"]).catch("any"),
  sort: z.enum(["newest", "oldest", "supplier"]).catch("newest"),
  page: z.coerce.number().int().min(1).max(100_000).catch(1),
});

/** The state of the list of deliveries, all of it in the URL. */
export type DeliveryFilter = z.infer<typeof filterSchema>;

export const deliveriesPerPage = 30;

/** Reads the list's state from its address. A value that makes no sense falls back, so that an old bookmark never breaks a page. */
export function readDeliveryFilter(params: URLSearchParams): DeliveryFilter {
  return filterSchema.parse({ q: "", supplier: "", species: "", ...Object.fromEntries(params) });
}
