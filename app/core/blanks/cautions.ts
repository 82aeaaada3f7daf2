import { requireSize, requireWithin } from "#app/core/moisture/accepted-range.ts";
import { plySpread } from "#app/core/moisture/plies.ts";
import { glueDefaults, shopDefaults } from "./shop-defaults.ts";

/** What is about to be done, as far as it is known. What is left out raises no caution. Sizes in mm. */
export interface Situation {
  /** The piece that goes over or through a machine. */
  piece?: { lengthMm: number; widthMm: number; thicknessMm: number };
  jointer?: { minLengthMm: number; maxWidthMm: number };
  planer?: { minLengthMm: number; maxWidthMm: number };
  /** How high a rip stands on the table saw, how high its blade cuts, and the gap between blade and fence where it is known. */
  rip?: { heightMm: number; bladeHeightMm: number; fenceGapMm?: number };
  /** Thick stock is parted through its thickness. */
  resawing?: boolean;
  dust?: { words: string; strongSensitiser: boolean } | null;
  trade?: { words: string } | null;
  /** Load of an arm over its rating. */
  armLoadShare?: number;
  liftKg?: number;
  gluing?: { temperatureC?: number; moisturesPct?: readonly number[] };
}

/** How well a caution's source is known; of several, the least known. The words are those of the trade reference's tags. */
export type CautionConfidence = "confirmed" | "confirmed-secondary" | "memory" | "practice";

/**
 * What is at stake, gravest first. "Danger": a machine or a falling load can maim at once. "Harm": health suffers, or an injury builds up. "Spoils": the
 * work, or the right to sell it, is lost. Our own ranking; no source ranks them together.
 */
export const severities = ["danger", "harm", "spoils"] as const;
export type Severity = (typeof severities)[number];

export interface Caution {
  id: string;
  severity: Severity;
  words: string;
  source: string;
  confidence: CautionConfidence;
}

interface Row {
  id: string;
  severity: Severity;
  when: (situation: Situation) => boolean;
  words: (situation: Situation) => string;
  source: string;
  confidence: CautionConfidence;
}

const inches = (n: number) => n * 25.4;
const manual = "The machine's manual, local safety law and trained practice come first.";
const shopRules = "School and shop rules (trade reference, section 10)";

/** One table: the condition, the words, where they come from. Thresholds are those of the sources; a machine's own limits, where the shop has entered them, replace them. */
const table: Row[] = [
  {
    id: "jointer-short",
    severity: "danger",
    when: ({ piece, jointer }) =>
      Boolean(piece && piece.lengthMm < (jointer?.minLengthMm ?? shopDefaults.jointerMinLengthMm)),
    words: () => `Too short for the jointer: mill it long and cut to length last, or plane it by hand. ${manual}`,
    source: `${shopRules} [secondary]: at least 12 in; one maker's manual says 10 in`,
    confidence: "confirmed-secondary",
  },
  {
    id: "jointer-thin",
    severity: "danger",
    when: ({ piece }) => Boolean(piece && piece.thicknessMm < inches(1 / 4)),
    words: () => `Too thin for jointer or planer without a carrier board: under 1/4 in. ${manual}`,
    source: `${shopRules} [secondary]`,
    confidence: "confirmed-secondary",
  },
  {
    id: "jointer-narrow",
    severity: "danger",
    when: ({ piece }) => Boolean(piece && piece.widthMm < inches(3)),
    words: () =>
      `Narrower than 3 in: a push stick on edges and a push block on faces, hands never over the cutter. ${manual}`,
    source: `${shopRules} [secondary]`,
    confidence: "confirmed-secondary",
  },
  {
    id: "jointer-wide",
    severity: "spoils",
    when: ({ piece, jointer }) => Boolean(piece && jointer && piece.widthMm > jointer.maxWidthMm),
    words: () => "Wider than this shop's jointer: rip it first, or flatten it another way.",
    source: "The shop's own setting",
    confidence: "practice",
  },
  {
    id: "planer-short",
    severity: "danger",
    when: ({ piece, planer }) =>
      Boolean(piece && piece.lengthMm < (planer?.minLengthMm ?? shopDefaults.planerMinLengthMm)),
    words: () =>
      `Shorter than the gap between the planer's rollers may be: it can turn or kick back. Plane it long. ${manual}`,
    source: `${shopRules} [secondary]: often 12 to 14 in; small machines print about 6 in`,
    confidence: "confirmed-secondary",
  },
  {
    id: "planer-wide",
    severity: "spoils",
    when: ({ piece, planer }) => Boolean(piece && planer && piece.widthMm > planer.maxWidthMm),
    words: () => "Wider than this shop's planer.",
    source: "The shop's own setting",
    confidence: "practice",
  },
  {
    id: "rip-narrow",
    severity: "danger",
    when: ({ rip }) => rip?.fenceGapMm !== undefined && rip.fenceGapMm < inches(6),
    words: () => `Less than 6 in between blade and fence: a push stick or block, never the hand. ${manual}`,
    source: "School and shop rules (trade reference, section 10); 29 CFR 1910.213 (s)(9), from memory",
    confidence: "memory",
  },
  {
    id: "rip-too-tall",
    severity: "danger",
    when: ({ rip }) => Boolean(rip && rip.heightMm > 2 * rip.bladeHeightMm),
    words: () =>
      `Two passes from both edges do not meet at this height: not a table saw's work. Part it on a bandsaw, or by hand. ${manual}`,
    source: "Arithmetic of two blade heights; the bandsaw, common practice (trade reference, section 10)",
    confidence: "practice",
  },
  {
    id: "rip-tall",
    severity: "danger",
    when: ({ rip }) => Boolean(rip && rip.heightMm > rip.bladeHeightMm && rip.heightMm <= 2 * rip.bladeHeightMm),
    words: () =>
      `Taller than the blade cuts in one pass. A bandsaw is the better tool. On a table saw it takes two passes, turned end for end with the same face to the fence, and a web left between them for the bandsaw or a handsaw: riving knife, guard wherever the cut lets it stay, featherboards, push blocks, and out of the line of the blade. ${manual}`,
    source: "Common practice (trade reference, section 10); 29 CFR 1910.213 (c), (s)(9), from memory",
    confidence: "memory",
  },
  {
    id: "resaw-tension",
    severity: "danger",
    when: ({ resawing }) => Boolean(resawing),
    words: () =>
      `Thick stock moves when it is parted: tension lets go and can close on the blade. Stop, wedge, let it rest a day, then flatten again. ${manual}`,
    source: "Common practice (trade reference, section 10)",
    confidence: "practice",
  },
  {
    id: "dust",
    severity: "harm",
    when: ({ dust }) => Boolean(dust),
    words: ({ dust }) =>
      `${dust?.words}${dust?.strongSensitiser ? " It is among the woods that sensitise most." : ""} Collect dust where it is made and wear a mask that fits.`,
    source: "HSE WIS30 Toxic woods (species words from memory); NIOSH limit 1 mg/m³ [confirmed, OSHA wood-dust page]",
    confidence: "memory",
  },
  {
    id: "trade",
    severity: "spoils",
    when: ({ trade }) => Boolean(trade),
    words: ({ trade }) => `${trade?.words} Keep its papers with the board's record, and check the current appendices.`,
    source: "CITES appendices, from memory",
    confidence: "memory",
  },
  {
    id: "arm-load",
    severity: "danger",
    when: ({ armLoadShare }) => (armLoadShare ?? 0) > 1,
    words: () =>
      "More on this arm than the rating the shop entered: take boards off. A rating kept does not make a rack safe; its maker's instructions and its anchors do.",
    source: "Trade reference, section 13: common practice; 29 CFR 1910.176(b), from memory",
    confidence: "memory",
  },
  {
    id: "lift",
    severity: "harm",
    when: ({ liftKg }) => (liftKg ?? 0) > 23,
    words: () => "Heavier than one person should lift even in a good place: take it by two, or slide it.",
    source: "NIOSH lifting equation's load constant, 23 kg, from memory",
    confidence: "memory",
  },
  {
    id: "glue-cold",
    severity: "spoils",
    when: ({ gluing }) => gluing?.temperatureC !== undefined && gluing.temperatureC < glueDefaults.leastTemperatureC,
    words: () =>
      "Colder than most wood glues take (about 50 °F, 10 °C): the film chalks and does not hold. The label says what yours needs.",
    source: "Trade reference, section 11: common practice",
    confidence: "practice",
  },
  {
    id: "glue-moisture",
    severity: "spoils",
    when: ({ gluing }) =>
      Boolean(gluing?.moisturesPct?.length) &&
      !plySpread(gluing?.moisturesPct ?? [], glueDefaults.pliesWithinPoints).isWithin,
    words: () =>
      "The plies are more than 2 points of moisture apart: they will part again, or cup. Let them even out before gluing.",
    source: "Trade reference, section 11: common practice, 1 to 2 points",
    confidence: "practice",
  },
];

/**
 * The cautions that a situation calls for, the gravest first, each with where it comes from and how well that is known. They stand beside the number that
 * calls for them.
 *
 * @throws RangeError for a figure that is none: a caution is never left out because a number could not be compared.
 */
export function cautionsFor(situation: Situation): Caution[] {
  requireFigures(situation);
  return table
    .filter(({ when }) => when(situation))
    .map(({ id, severity, words, source, confidence }) => ({
      id,
      severity,
      words: words(situation),
      source,
      confidence,
    }))
    .sort((a, b) => severities.indexOf(a.severity) - severities.indexOf(b.severity));
}

function requireFigures({ piece, jointer, planer, rip, armLoadShare, liftKg, gluing }: Situation): void {
  if (piece) {
    requireSize("Piece's length", piece.lengthMm);
    requireSize("Piece's width", piece.widthMm);
    requireSize("Piece's thickness", piece.thicknessMm);
  }
  for (const machine of [jointer, planer]) {
    requireWithin("Machine's least length", machine?.minLengthMm ?? 0, 0, 100_000, "mm");
    // A machine that any width goes through may be given as infinitely wide.
    if (machine?.maxWidthMm !== Number.POSITIVE_INFINITY)
      requireWithin("Machine's greatest width", machine?.maxWidthMm ?? 0, 0, 100_000, "mm");
  }
  if (rip) {
    requireSize("Height on the saw", rip.heightMm);
    requireSize("Blade height", rip.bladeHeightMm);
    requireWithin("Gap to the fence", rip.fenceGapMm ?? 0, 0, 10_000, "mm");
  }
  requireWithin("Share of the arm's rating", armLoadShare ?? 0, 0, 1_000_000);
  requireWithin("Weight to lift", liftKg ?? 0, 0, 1_000_000, "kg");
  requireWithin("Temperature at the glue-up", gluing?.temperatureC ?? 20, -60, 100, "°C");
  for (const moisture of gluing?.moisturesPct ?? []) requireWithin("A ply's moisture", moisture, 0, 600, "%");
}
