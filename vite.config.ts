import { reactRouter } from "@react-router/dev/vite";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "vitest/config";

const testing = Boolean(process.env.VITEST);

export default defineConfig({
  plugins: testing ? [] : [tailwindcss(), reactRouter()],
  server: { host: "127.0.0.1" },
  test: {
    projects: [
      {
        extends: true,
        test: { name: "unit", include: ["{app,scripts,tests}/**/*.test.{ts,tsx}"], exclude: ["**/*.db.test.ts", "tests/e2e/**"] },
      },
      {
        extends: true,
        test: {
          name: "db",
          include: ["{app,scripts,tests}/**/*.db.test.ts"],
          globalSetup: ["tests/setup/database.ts"],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
