import type { Crayon } from "#app/components/crayon.tsx";

export const projectStates = ["planned", "underway", "done", "dropped"] as const;
export type ProjectState = (typeof projectStates)[number];

/** A piece, or a set of pieces, that boards are spoken for. */
export interface Project {
  id: string;
  name: string;
  client: string;
  /** YYYY-MM-DD. */
  dueOn: string | null;
  crayon: Crayon;
  state: ProjectState;
  notes: string;
  version: number;
}

/** A row of the project list, with what its live holds add up to. */
export interface ProjectSummary extends Project {
  boards: number;
  heldMm: number;
}

/** One part of a project: finished sizes and the ring angles it asks for. */
export interface Part {
  id: string;
  name: string;
  quantity: number;
  thicknessMm: number;
  widthMm: number;
  lengthMm: number;
  species: string;
  ringMinDeg: number;
  ringMaxDeg: number;
  version: number;
}
