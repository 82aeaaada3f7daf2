import path from "node:path";
import { pathToFileURL } from "node:url";
import { Worker } from "node:worker_threads";
import { log } from "./log.server.ts";

/** Work that is done beside the web process, which answers other people meanwhile. */
export interface WorkerThread<Question, Answer> {
  /** Never throws: a thread that hangs or dies is replaced, and its question gets the stand-in answer. */
  ask(question: Question): Promise<Answer>;
  close(): Promise<void>;
}

interface ThreadOptions<Answer> {
  /** The thread's file in app/services, such as "ring-reading.worker.ts". It answers `{ id, question }` with `{ id, answer }`. */
  file: string;
  patienceMs: number;
  /** What to answer when the thread cannot. */
  standIn: Answer;
  /** The project's folder: threads run from source, as this process does. */
  root?: string;
}

/** A thread of its own for one kind of work, started at the first question. */
export function createThread<Question, Answer>({
  file,
  patienceMs,
  standIn,
  root = process.cwd(),
}: ThreadOptions<Answer>): WorkerThread<Question, Answer> {
  let worker: Worker | undefined;
  let serial = 0;
  const waiting = new Map<number, (answer: Answer) => void>();

  function start(): Worker {
    const services = path.join(root, "app/services");
    const entry = pathToFileURL(path.join(services, file)).href;
    const started = new Worker(path.join(services, "worker-entry.mjs"), { workerData: { entry } });
    started.unref();
    started.on("message", ({ id, answer }: { id: number; answer: Answer }) => settle(id, answer));
    started.on("error", (error) => {
      log().error({ err: error, file }, "a worker thread broke");
      fail(started);
    });
    started.on("exit", () => fail(started));
    return started;
  }
  function settle(id: number, answer: Answer) {
    waiting.get(id)?.(answer);
    waiting.delete(id);
  }
  /** All who wait on a thread that ended get an answer; the next question starts another. */
  function fail(ended: Worker) {
    if (worker !== ended) return;
    worker = undefined;
    for (const id of [...waiting.keys()]) settle(id, standIn);
  }

  return {
    ask(question) {
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
