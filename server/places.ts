/** Where the files beside the code are, both when run from the sources and from the bundle in `dist/server`. */
import path from "node:path";
import { fileURLToPath } from "node:url";

const here = path.dirname(fileURLToPath(import.meta.url));
const isBundled = path.basename(path.dirname(here)) === "dist";

export const places = {
  migrations: path.join(here, isBundled ? "drizzle" : "../drizzle"),
  demoNotebooks: path.join(here, "demo/notebooks"),
  client: path.join(here, isBundled ? "../client" : "../dist/client"),
  evaluationWorker: path.join(here, isBundled ? "evaluationWorker.js" : "jobs/evaluationWorker.sources.mjs"),
};
