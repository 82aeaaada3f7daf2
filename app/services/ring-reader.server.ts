import type { WoodStructure } from "#app/core/endgrain/confidence.ts";
import type { ClassLimits, RingField } from "#app/core/rings/ring-types.ts";
import { createThread, type WorkerThread } from "./worker-thread.server.ts";

interface Point {
  x: number;
  y: number;
}

/** A photo's file and what is known of the end on it. Corners in the photo's own pixels; without them the reader looks for the end itself. */
export interface RingQuestion {
  bytes: Uint8Array;
  corners?: Point[];
  widthMm: number;
  thicknessMm: number;
  limits: ClassLimits;
  structure?: WoodStructure;
}

export type RingAnswer =
  | {
      ok: true;
      corners: Point[];
      field: RingField;
      /** The rings as seen, to draw over the photo in its pixels. */
      ringLines: Point[][];
      confidence: number;
      sure: boolean;
      doubts: string[];
      methodVersion: string;
    }
  | { ok: false; message: string; corners: Point[] | null };

/** Reads one photo after another in a thread of its own. Never throws for what is on them. */
export type RingReader = WorkerThread<RingQuestion, RingAnswer>;

/** @param root the project's folder. */
export function createRingReader(root?: string): RingReader {
  return createThread({
    file: "ring-reading.worker.ts",
    patienceMs: 15_000,
    standIn: { ok: false, message: "The reader gave no answer. Try again, or mark the rings by hand.", corners: null },
    root,
  });
}

let reader: RingReader | undefined;

/** The reader of this process. */
export function appRingReader(): RingReader {
  reader ??= createRingReader();
  return reader;
}
