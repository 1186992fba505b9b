// Bundles the server, its worker and the seed into dist/server, with the files they read, and compresses the built
// page. Runs in `npm run build`, after the page is built.
import { cp, rm } from "node:fs/promises";
import path from "node:path";
import { build } from "esbuild";
import { precompress } from "./precompress.mjs";

const root = path.resolve(import.meta.dirname, "..");
const target = path.join(root, "dist/server");

await rm(target, { recursive: true, force: true });
await build({
  absWorkingDir: root,
  entryPoints: {
    main: "server/main.ts",
    seed: "scripts/seed.ts",
    evaluationWorker: "server/jobs/evaluationWorker.ts",
  },
  outdir: target,
  bundle: true,
  // What the entries share is written once, beside them, so that each finds its files by its own place.
  splitting: true,
  chunkNames: "[name]-[hash]",
  platform: "node",
  format: "esm",
  target: "node20",
  packages: "external",
  sourcemap: true,
  logLevel: "warning",
});
await cp(path.join(root, "drizzle"), path.join(target, "drizzle"), { recursive: true });
await cp(path.join(root, "server/demo/notebooks"), path.join(target, "demo/notebooks"), { recursive: true });
await precompress(path.join(root, "dist/client"));
