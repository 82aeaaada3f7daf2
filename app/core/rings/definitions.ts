import type { ClassLimits } from "./ring-types.ts";

/** What a published source calls flat, rift and quartered, by the angle between growth rings and wide face. */
export interface RingDefinition {
  source: string;
  flat: string | null;
  rift: string | null;
  quartered: string | null;
  note: string;
  /** How the figures were seen: in the source or a copy of it; in another publication quoting it; recalled; or nowhere, being usage. */
  confidence: "confirmed" | "secondary" | "memory" | "practice";
  /** The limits a shop gets by choosing this definition; null where it names no angles to part all three. Equal limits leave no rift. */
  limits: ClassLimits | null;
}

/** The published definitions side by side. They disagree: a shop chooses, and every screen that shows a class shows the angles too. */
export const ringDefinitions: readonly RingDefinition[] = [
  {
    source: "Architectural Woodwork Standards, edition 1 (2009), appendix B, Lumber",
    flat: "typically 30° or less",
    rift: "about 30° to 60°",
    quartered: "about 60° to 90°",
    note: "The limits a new shop starts with.",
    confidence: "confirmed",
    limits: { flatBelowDeg: 30, quarteredAboveDeg: 60 },
  },
  {
    source: "National Hardwood Lumber Association, chief inspector's Rules Corner (March 2023), industry usage",
    flat: null,
    rift: "30° to 60°, 45° best",
    quartered: "60° to 90°, 90° best",
    note: "A description of usage, not a rule.",
    confidence: "confirmed",
    limits: { flatBelowDeg: 30, quarteredAboveDeg: 60 },
  },
  {
    source: 'National Hardwood Lumber Association, rules of 2023, paragraph 35 "Quartered Lumber"',
    flat: null,
    rift: null,
    quartered: "45° or more",
    note: "Written as radial grain at 45° or less to the face, over 80 % of the cutting surface where figure is not asked for. Judged on cuttings, not on ends. The book does not use the word rift.",
    confidence: "confirmed",
    limits: { flatBelowDeg: 45, quarteredAboveDeg: 45 },
  },
  {
    source: "Wood Handbook, USDA Forest Products Laboratory, chapter 3",
    flat: "0° to 45°",
    rift: "30° to 60°, sometimes called bastard sawn (from memory)",
    quartered: "45° to 90°",
    note: "Parts all lumber in two at 45°.",
    confidence: "secondary",
    limits: { flatBelowDeg: 45, quarteredAboveDeg: 45 },
  },
  {
    source: "A US hardwood distributor's guide",
    flat: "0° to 45°",
    rift: "45° to 75°",
    quartered: "75° to 90°",
    note: "Rift chosen to hide ray fleck.",
    confidence: "secondary",
    limits: { flatBelowDeg: 45, quarteredAboveDeg: 75 },
  },
  {
    source: "Softwood trade (Wood Handbook glossary)",
    flat: "flat grain: under 45°",
    rift: null,
    quartered: "vertical or edge grain: 45° or more",
    note: "",
    confidence: "memory",
    limits: { flatBelowDeg: 45, quarteredAboveDeg: 45 },
  },
  {
    source: "Architectural Woodwork Institute, 300 Materials",
    flat: null,
    rift: "rift oak: ray fleck on up to 25 % of the exposed surface",
    quartered: null,
    note: "Judged by the look of the face; names no angle.",
    confidence: "confirmed",
    limits: null,
  },
  {
    source: "Oak flooring rules, quoted in the Wood Handbook",
    flat: "plain: all cuts",
    rift: "75 % rift character",
    quartered: "50 % quartered character",
    note: "Judged by the look of the face; names no angle.",
    confidence: "secondary",
    limits: null,
  },
  {
    source: "European usage",
    flat: "tangential",
    rift: 'semi-radial, "rift"',
    quartered: "radial; true quarter within about 10° to 15° of the rays",
    note: "Common practice, no source.",
    confidence: "practice",
    limits: null,
  },
];
