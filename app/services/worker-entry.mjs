import { workerData } from "node:worker_threads";
import { register } from "tsx/esm/api";

/** The first file of a worker thread. Node 20 does not hand its process's loader for TypeScript on to threads, so this one registers it and goes on. */
register();
await import(workerData.entry);
