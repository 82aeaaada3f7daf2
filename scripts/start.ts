import { buildIfChanged } from "./build-if-changed.ts";
import { runShop } from "./run-shop.ts";

/** Runs the shop from the production build. */
await runShop({
  mode: "production",
  prepare: buildIfChanged,
  webProcess: () => ["--import", "tsx", "scripts/serve.ts"],
});
