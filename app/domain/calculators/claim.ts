import { z } from "zod";
import { parseSize } from "#app/core/lengths/parse-size.ts";
import { type ClaimCompared, compareClaim } from "#app/core/measure/claim.ts";
import { kilnAllowancePct } from "#app/core/measure/kiln-allowance.ts";
import { type Tally, type TallyLine, tally } from "#app/core/measure/tally.ts";
import { moneyField } from "#app/domain/shop/money.ts";
import type { Source } from "#app/domain/sources/source.ts";
import { type Asked, ask, inUnits, type ShopForCalculators } from "./ask.ts";
import { numberField } from "./number-field.ts";

export type ClaimBox = "quarters" | "boards" | "claimed" | "unit" | "tallied" | "allowance" | "price" | "basis";

export interface ClaimAnswer {
  tally: Omit<Tally, "lines">;
  compared: ClaimCompared;
  isGross: boolean;
  beyond: string[];
}

const mostLines = 200;

/** Boards as lines of text, such as `3 @ 8 x 10'`. The first line that cannot be read is named. */
function linesField(units: ShopForCalculators["units"]) {
  return z.string().transform((typed, context) => {
    const lines = typed.split(/\r\n|\r|\n/).map((text, index) => ({ text: text.trim(), number: index + 1 }));
    const written = lines.filter(({ text }) => text !== "");
    const refuse = (message: string) => {
      context.addIssue({ code: "custom", message });
      return z.NEVER;
    };
    if (written.length === 0) return refuse("Give at least one board.");
    if (written.length > mostLines) return refuse(`At most ${mostLines} lines.`);
    const read: Omit<TallyLine, "quarters">[] = [];
    for (const { text, number } of written) {
      const size = parseSize(text, { width: units, length: units });
      if (!size.ok) return refuse(`Line ${number}: ${size.why}`);
      read.push(size);
    }
    return read;
  });
}

function schema({ units, currency }: ShopForCalculators) {
  return z.object({
    quarters: numberField({ name: "thickness in quarters", least: 1, most: 40, unit: "quarters", whole: true }),
    boards: linesField(units),
    claimed: numberField({ name: "volume claimed", least: 0.001, most: 1_000_000 }),
    unit: z.enum(["bf", "m3"], "Choose board feet or m³."),
    tallied: z.enum(["net", "gross"], "Choose when it was tallied."),
    allowance: numberField({ name: "kiln allowance", least: 0, most: 50, unit: "%" }),
    price: moneyField(currency),
    basis: z.enum(["bf", "m3", "lump"], "Choose what the price is for."),
  });
}

/** Holds a claim against boards, all of it from the page's address. */
export function askClaim(params: URLSearchParams, shop: ShopForCalculators): Asked<ClaimBox, ClaimAnswer> {
  const start = {
    quarters: "4",
    boards: inUnits(shop.units, "8 x 10'\n7 1/2 x 12'\n3 @ 6 1/4 x 8'", "200 x 3.05\n190 x 3.66\n3 @ 160 x 2.45"),
    claimed: inUnits(shop.units, "28", "0.07"),
    unit: inUnits(shop.units, "bf", "m3"),
    tallied: "net",
    allowance: String(kilnAllowancePct.usual),
    price: inUnits(shop.units, "8.50", "2400"),
    basis: inUnits(shop.units, "bf", "m3"),
  };
  return ask(params, start, schema(shop), (typed) => {
    const { lines: _, ...measured } = tally(typed.boards.map((line) => ({ ...line, quarters: typed.quarters })));
    const isGross = typed.tallied === "gross";
    const compared = compareClaim({ volume: typed.claimed, unit: typed.unit, isGross }, measured, {
      price: typed.price === null ? null : { minor: typed.price, basis: typed.basis },
      allowancePct: typed.allowance,
    });
    const { least, most } = kilnAllowancePct;
    const isUsual = !isGross || (typed.allowance >= least && typed.allowance <= most);
    return {
      tally: measured,
      compared,
      isGross,
      beyond: isUsual ? [] : [`A kiln usually takes ${least} to ${most} %.`],
    };
  });
}

export const claimFormula = [
  "measured = the sum over boards of surface measure × nominal thickness (m³: thickness × width × length)",
  "expected = claimed, or claimed × (100 − kiln allowance) ÷ 100 where it was tallied green",
  "difference = measured − expected; money = charged × difference ÷ expected",
];

export const claimSources: Source[] = [
  { of: "Tally by surface measure", text: "NHLA Rules 2023 p. 9 para. 18; AHEC, Measurement", confidence: "confirmed" },
  { of: "Surface measure wins a dispute over an end tally", text: "NHLA Rules Corner", confidence: "confirmed" },
  { of: "Half feet alternately", text: "NHLA, Measurement & Tally", confidence: "memory" },
  { of: "A kiln takes 6 to 8 %, about 7", text: "mills and yards", confidence: "practice" },
];
