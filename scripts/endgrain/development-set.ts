import { existsSync, readFileSync } from "node:fs";
import type { ClassShares, RingClass } from "#app/core/rings/ring-types.ts";

/** Folder of the development photographs, relative to the repository's root; never committed. */
export const DEVELOPMENT_FOLDER = "../shared/endgrain";

/** One photograph with its truth, as the folder's README describes it. */
export type DevelopmentEnd = {
  file: string;
  tree: string;
  source: string;
  width: number;
  height: number;
  pith: { x: number; y: number; inside: boolean } | null;
  stations: { x: number; angle: number; spread: number; signed: number }[];
  meanAngle: number;
  share: ClassShares;
  dominant: RingClass;
  pixelsPerMm?: number;
  ringsPerInch?: number;
};

/** The development photographs, or none when the folder is not there. */
export function developmentEnds(): DevelopmentEnd[] {
  const truth = `${DEVELOPMENT_FOLDER}/truth.json`;
  if (!existsSync(truth)) return [];
  return (JSON.parse(readFileSync(truth, "utf8")) as { crops: DevelopmentEnd[] }).crops;
}

/** Whether the largest share leads the next by less than a tenth, so that neither class is wrong. */
export function isNearTie(share: ClassShares): boolean {
  const [first, second] = Object.values(share).sort((a, b) => b - a);
  return first! - second! < 0.1;
}
