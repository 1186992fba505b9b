import tailwindcss from "@tailwindcss/vite";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

/** Every test runs in one time zone, so that dates read the same everywhere. */
const testEnvironment = { TZ: "UTC" };

export default defineConfig({
  plugins: [react(), tailwindcss()],
  // Formulas must be set by the KaTeX whose style sheet is loaded, not by the older one that its plugin brings along.
  resolve: { dedupe: ["katex"] },
  build: {
    outDir: "dist/client",
    emptyOutDir: true,
    // A small font inlined as a data URL would be refused by the content-security policy.
    assetsInlineLimit: 0,
    chunkSizeWarningLimit: 5000,
    // From these on browsers know light-dark() themselves; put in other words it could not be asked for the light of
    // day on a dark page, which figures that leave the page need.
    cssTarget: ["chrome123", "firefox120", "safari17.5"],
  },
  worker: { format: "es" },
  // The page's own address stays in the request: the server takes changes from its own pages only.
  server: { proxy: { "/api": { target: "http://127.0.0.1:4710", changeOrigin: false } } },
  test: {
    env: testEnvironment,
    reporters: ["default", "./tests/closingLine.ts"],
    projects: [
      { extends: true, test: { name: "architecture", include: ["tests/architecture/**/*.test.ts"] } },
      { extends: true, test: { name: "shared", include: ["tests/shared/**/*.test.ts"] } },
      {
        extends: true,
        test: {
          name: "server",
          include: ["tests/server/**/*.test.ts"],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: "client",
          include: ["tests/client/**/*.test.{ts,tsx}"],
          environment: "jsdom",
          setupFiles: ["tests/client/setup.ts"],
        },
      },
      {
        extends: true,
        test: {
          name: "e2e",
          include: ["tests/e2e/**/*.test.ts"],
          fileParallelism: false,
          testTimeout: 120_000,
          hookTimeout: 180_000,
        },
      },
    ],
  },
});
