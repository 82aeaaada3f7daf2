import { z } from "zod";
import { roles } from "#app/domain/shop/permissions.ts";

/** An e-mail as it is compared and kept: trimmed, in lower case. */
export const emailField = z
  .string({ error: "Give an e-mail address." })
  .trim()
  .toLowerCase()
  .max(254, "That is too long for an e-mail address.")
  .pipe(z.email("That is not an e-mail address: name@place.example."));

/** Where to go after is no box that anybody could correct, so what does not fit a cookie is left out instead of refused. */
export const signInForm = z.object({ email: emailField, to: z.string().max(2000).default("/").catch("/") });

/** Six digits; spaces that people copy along are taken out. */
export const codeForm = z.object({
  code: z
    .string({ error: "Type the six digits." })
    .transform((typed) => typed.replace(/\D/g, ""))
    .pipe(z.string().length(6, "The code has six digits.")),
});

const personName = z
  .string({ error: "Say what people call you." })
  .trim()
  .min(1, "Say what people call you.")
  .max(120, "At most 120 characters.");

export const newShopForm = z.object({
  personName,
  name: z.string({ error: "Name the shop." }).trim().min(1, "Name the shop.").max(120, "At most 120 characters."),
  units: z.enum(["in", "mm"]).default("in"),
  currency: z
    .string()
    .trim()
    .toUpperCase()
    .refine((code) => Intl.supportedValuesOf("currency").includes(code), "Three letters, such as USD or EUR.")
    .default("USD"),
});

export const inviteForm = z.object({ email: emailField, role: z.enum(roles, { error: "Choose a role." }) });

export const nameForm = z.object({ intent: z.literal("name"), name: personName });
