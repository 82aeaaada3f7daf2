import { runShop } from "./run-shop.ts";

/** Runs the shop for development: a change of the code is seen at once. */
await runShop({
  mode: "development",
  webProcess: ({ HOST, PORT }) => [
    "node_modules/@react-router/dev/bin.js",
    "dev",
    "--host",
    HOST,
    "--port",
    String(PORT),
    "--strictPort",
  ],
});
