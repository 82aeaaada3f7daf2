import type { FaceArea } from "./empty-rectangles.ts";

/** A defect on one face; what it is, in the trade's words, where it is known. */
export interface FaceDefect extends FaceArea {
  kind?: string;
}

/**
 * How a defect counts. "None": no defect. "Sound": a sound cutting may hold it, and so may the back of a clear one. "Unsound": neither may. "Unknown":
 * it may be sound, as a knot may; it is kept out of cuttings, but the back of one is taken to be sound.
 */
type Standing = "none" | "sound" | "unknown" | "unsound";

/**
 * Sapwood is no defect unless the contract says so, and stain is allowed in sound cuttings and on the back of clear ones: NHLA [confirmed, trade reference,
 * sections 2 and 15]. That bird pecks are sound, and that rot, pith, shake and wane are not, from memory of the NHLA definition of a sound cutting. Holes,
 * splits and honeycomb go with those by their nature: common practice.
 */
const standings: Readonly<Record<string, Standing>> = {
  sapwood: "none",
  stain: "sound",
  "bird peck": "sound",
  decay: "unsound",
  pith: "unsound",
  shake: "unsound",
  wane: "unsound",
  hole: "unsound",
  split: "unsound",
  honeycomb: "unsound",
};

/** How a defect counts, by its kind; "unknown" for a knot and whatever else may be either. */
export function standingOf({ kind }: FaceDefect): Standing {
  return (kind === undefined ? undefined : standings[kind]) ?? "unknown";
}

/** What cuttings of a face must keep clear of: its own defects, and on its back whatever is surely unsound. Both faces are measured from the same corner. */
export function keptClearOf(
  face: readonly FaceDefect[],
  back: readonly FaceDefect[],
  cuttings: "clear" | "sound",
): FaceArea[] {
  const own = face.filter((defect) => {
    const standing = standingOf(defect);
    return standing !== "none" && (cuttings === "clear" || standing !== "sound");
  });
  return [...own, ...back.filter((defect) => standingOf(defect) === "unsound")];
}
