import path from "node:path";
import { pathToFileURL } from "node:url";
import { Worker } from "node:worker_threads";
import type { WoodStructure } from "#app/core/endgrain/confidence.ts";
import type { ClassLimits, RingField } from "#app/core/rings/ring-types.ts";
import { log } from "./log.server.ts";

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

export interface RingReader {
  /** Reads one photo. Never throws for what is on it; a reader that hangs or dies is replaced and says so. */
  read(question: RingQuestion): Promise<RingAnswer>;
  close(): Promise<void>;
}

const patienceMs = 15_000;
const busy: RingAnswer = {
  ok: false,
  message: "Reading took too long. Try again, or mark the rings by hand.",
  corners: null,
};

/**
 * A reader in a worker thread of its own, started at the first question. The thread runs from source, as this process does.
 *
 * @param root the project's folder.
 */
export function createRingReader(root = process.cwd()): RingReader {
  let worker: Worker | undefined;
  let serial = 0;
  const waiting = new Map<number, (answer: RingAnswer) => void>();

  function start(): Worker {
    const services = path.join(root, "app/services");
    const entry = pathToFileURL(path.join(services, "ring-reading.worker.ts")).href;
    const started = new Worker(path.join(services, "worker-entry.mjs"), { workerData: { entry } });
    started.unref();
    started.on("message", ({ id, answer }: { id: number; answer: RingAnswer }) => settle(id, answer));
    started.on("error", (error) => {
      log().error({ err: error }, "the ring reader broke");
      fail(started);
    });
    started.on("exit", () => fail(started));
    return started;
  }
  function settle(id: number, answer: RingAnswer) {
    waiting.get(id)?.(answer);
    waiting.delete(id);
  }
  /** All who wait on a thread that ended get an answer; the next question starts another. */
  function fail(ended: Worker) {
    if (worker !== ended) return;
    worker = undefined;
    for (const id of [...waiting.keys()]) settle(id, busy);
  }

  return {
    read(question) {
      worker ??= start();
      const asked = worker;
      const id = ++serial;
      return new Promise((resolve) => {
        const timer = setTimeout(() => {
          fail(asked);
          void asked.terminate();
        }, patienceMs);
        waiting.set(id, (answer) => {
          clearTimeout(timer);
          resolve(answer);
        });
        asked.postMessage({ id, question });
      });
    },
    async close() {
      const ended = worker;
      worker = undefined;
      await ended?.terminate();
    },
  };
}

let reader: RingReader | undefined;

/** The reader of this process. */
export function appRingReader(): RingReader {
  reader ??= createRingReader();
  return reader;
}
