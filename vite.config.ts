import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { configDefaults, defineConfig } from "vitest/config";

const apiTarget = process.env.API_TARGET ?? "http://127.0.0.1:4300";

export default defineConfig({
  plugins: [react(), tailwindcss()],
  publicDir: "src/public",
  build: { outDir: "dist/web", assetsInlineLimit: 0, sourcemap: false },
  server: {
    host: "127.0.0.1",
    watch: { ignored: ["**/.local/**"] },
    proxy: { "/api": apiTarget, "/auth": apiTarget },
  },
  test: {
    globalSetup: "tests/support/global-setup.ts",
    reporters: ["default", "./tests/support/plain-reporter.ts"],
    env: { TZ: "UTC" },
    exclude: [...configDefaults.exclude, ".local/**"],
    projects: [
      {
        test: {
          name: "unit",
          include: ["tests/shared/**/*.test.ts", "tests/architecture/**/*.test.ts"],
          env: { TZ: "UTC" },
        },
      },
      {
        test: {
          name: "api",
          include: ["tests/server/**/*.test.ts"],
          env: { TZ: "UTC" },
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
      {
        plugins: [react()],
        test: {
          name: "ui",
          include: ["tests/src/**/*.test.{ts,tsx}"],
          environment: "jsdom",
          setupFiles: ["tests/support/ui-setup.ts"],
          env: { TZ: "UTC" },
          testTimeout: 40_000,
        },
      },
      {
        test: {
          name: "e2e",
          include: ["tests/e2e/**/*.test.ts"],
          globalSetup: ["tests/support/e2e-setup.ts"],
          env: { TZ: "UTC" },
          testTimeout: 240_000,
          hookTimeout: 180_000,
          expect: { poll: { timeout: 15_000, interval: 100 } },
          fileParallelism: false,
          sequence: { groupOrder: 1 },
        },
      },
    ],
  },
});
