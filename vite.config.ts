import { reactRouter } from "@react-router/dev/vite";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "vitest/config";

const testing = Boolean(process.env.VITEST);

/** Settings for tests that run routes without a server. Nothing listens at these addresses. */
const testSettings = {
  NODE_ENV: "test",
  LOG_LEVEL: "silent",
  PUBLIC_URL: "http://rack.example",
  DATABASE_URL: "mysql://nobody@127.0.0.1:1/none",
  SESSION_SECRETS: "a secret that is only for tests and is long enough",
  S3_ENDPOINT: "http://files.example",
  S3_BUCKET: "tests",
  S3_ACCESS_KEY_ID: "tests",
  S3_SECRET_ACCESS_KEY: "tests",
  SMTP_URL: "smtp://mail.example",
  MAIL_FROM: "Rayfleck <rack@shop.example>",
};

export default defineConfig({
  plugins: testing ? [] : [tailwindcss(), reactRouter()],
  server: { host: "127.0.0.1" },
  test: {
    env: testSettings,
    projects: [
      {
        extends: true,
        test: {
          name: "unit",
          include: ["{app,scripts,tests}/**/*.test.{ts,tsx}"],
          exclude: ["**/*.db.test.ts", "tests/e2e/**"],
        },
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
