import { z } from "zod";

/** A supplier as typed. */
export const supplierForm = z.object({
  name: z
    .string({ error: "Name the supplier." })
    .trim()
    .min(1, "Name the supplier.")
    .max(120, "At most 120 characters."),
  email: z.union([z.literal(""), z.email("That is not an e-mail address.").max(254)]).default(""),
  phone: z.string().trim().max(40, "At most 40 characters.").default(""),
  notes: z.string().trim().max(4000, "At most 4,000 characters.").default(""),
});

export type SupplierForm = z.infer<typeof supplierForm>;
