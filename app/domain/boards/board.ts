import type { Crayon } from "#app/components/crayon.tsx";
import type { RingClass, RingField } from "#app/core/rings/ring-types.ts";

export const boardStates = ["racked", "out", "used", "sold", "lost"] as const;
export type BoardState = (typeof boardStates)[number];

export const boardEdges = ["sawn", "one live", "live"] as const;
export type BoardEdges = (typeof boardEdges)[number];

export const boardSurfaces = ["rough", "skip", "S2S", "S3S", "S4S"] as const;
export type BoardSurface = (typeof boardSurfaces)[number];

/** Figure in the trade's words (trade reference, section 14); "" is none seen. */
export const figureKinds = [
  "curl",
  "quilt",
  "bird's eye",
  "ray fleck",
  "ribbon",
  "mottle",
  "pommele",
  "crotch",
  "burl",
  "stump",
  "cathedral",
  "straight",
  "spalt",
  "cat's paw",
  "roe",
] as const;

export const figureStrengths = ["none", "light", "clear", "strong"] as const;

/** A live claim on a length of a board, as lists and drawings show it. Lengths from the near end. */
export interface HoldMark {
  holdId: string;
  projectId: string;
  projectName: string;
  crayon: Crayon;
  fromMm: number;
  toMm: number;
  state: "held" | "out";
  placedBy: string;
  placedById: string;
  expiresAt: Date;
}

/** What a list row, a rack drawing or a tag needs to know of a board. */
export interface BoardSummary {
  id: string;
  tag: string;
  species: string;
  quarters: number;
  thicknessMm: number;
  lengthMm: number;
  widthMm: number;
  widthFarMm: number | null;
  state: BoardState;
  ringClass: RingClass | null;
  ringMinDeg: number | null;
  ringMaxDeg: number | null;
  rings: RingField | null;
  moisturePct: number | null;
  figureKind: string;
  figureStrength: number;
  armId: string | null;
  place: string | null;
  holds: HoldMark[];
}

/** The whole record of a board. Money is null for those who may not see it. */
export interface Board extends BoardSummary {
  tagNumber: number;
  deliveryId: string | null;
  delivery: { receivedOn: string; supplierName: string; reference: string } | null;
  parent: { id: string; tag: string } | null;
  edges: BoardEdges;
  surface: BoardSurface;
  grade: string;
  figureWhere: string;
  sapSharePct: number | null;
  colourNote: string;
  notes: string;
  logName: string;
  logSequence: number | null;
  costMinor: number | null;
  ringMeanDeg: number | null;
  moistureAt: Date | null;
  version: number;
  createdAt: Date;
}
