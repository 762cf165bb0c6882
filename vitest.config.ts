import { fileURLToPath } from "node:url";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));
const alias = { "@": root.replace(/\/$/, ""), "server-only": `${root}tests/support/empty.ts` };

export default defineConfig({
  plugins: [react()],
  resolve: { alias },
  test: {
    coverage: { provider: "v8", include: ["lib/calc/**", "lib/notify/**"], reporter: ["text-summary", "json-summary"] },
    projects: [
      {
        extends: true,
        test: {
          name: "unit",
          include: [
            "tests/*.test.ts",
            "tests/calc/**/*.test.ts",
            "tests/notify/**/*.test.ts",
            "tests/templates/**/*.test.ts",
          ],
          exclude: ["tests/**/*.documents.test.ts"],
          environment: "node",
          testTimeout: 20_000,
        },
      },
      {
        extends: true,
        test: {
          name: "documents",
          include: ["tests/templates/**/*.documents.test.ts"],
          environment: "node",
          testTimeout: 300_000,
          hookTimeout: 300_000,
        },
      },
      {
        extends: true,
        test: { name: "components", include: ["tests/components/**/*.test.tsx"], environment: "jsdom" },
      },
      {
        extends: true,
        test: {
          name: "database",
          include: ["tests/db/**/*.test.ts", "tests/server/**/*.test.ts"],
          environment: "node",
          globalSetup: ["tests/support/database.ts"],
          testTimeout: 30_000,
          hookTimeout: 60_000,
          fileParallelism: false,
        },
      },
      {
        extends: true,
        test: {
          name: "browser",
          include: ["tests/e2e/**/*.test.ts"],
          environment: "node",
          globalSetup: ["tests/support/production.ts"],
          testTimeout: 180_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
