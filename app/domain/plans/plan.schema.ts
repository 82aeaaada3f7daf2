import { z } from "zod";
import { identifier } from "#app/core/identifiers/identifier.ts";
import { parseMoney } from "#app/domain/shop/money.ts";
import type { PlanWeights } from "./plan-problem.ts";

const stretch = z.object({
  boardId: z.string().regex(identifier),
  fromMm: z.number().min(0).max(20_000),
  toMm: z.number().min(0).max(20_000),
});

/** The stretches of an accepted plan, as JSON in one field. */
export const acceptForm = z.object({
  stretches: z
    .string()
    .max(200_000)
    .transform((text, context) => {
      try {
        return z.array(stretch).min(1).max(500).parse(JSON.parse(text));
      } catch {
        context.addIssue({ code: "custom", message: "The plan did not arrive whole." });
        return z.NEVER;
      }
    }),
});

const typed = z.object({
  charge: z.string().max(20).catch("2"),
  credit: z.coerce.number().min(0).max(100).catch(60),
  rings: z.coerce.number().min(10).max(100).catch(90),
});

export type TypedWeights = z.infer<typeof typed>;

/** Reads a plan's weights from the page's address; what makes no sense falls back to the usual. */
export function readWeights(params: URLSearchParams, currency: string): { read: PlanWeights; typed: TypedWeights } {
  const given = typed.parse({
    charge: "2",
    credit: 60,
    rings: 90,
    ...Object.fromEntries([...params].filter(([, value]) => value !== "")),
  });
  const charge = parseMoney(given.charge, currency);
  return {
    typed: given,
    read: {
      boardChargeMinor: charge.ok ? charge.minor : 0,
      offcutCredit: given.credit / 100,
      ringShare: given.rings / 100,
    },
  };
}
