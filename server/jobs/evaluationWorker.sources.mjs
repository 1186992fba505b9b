// Entry of the worker thread where the server runs from its sources, which a thread does not read by itself.
import { register } from "tsx/esm/api";

register();
await import("./evaluationWorker.ts");
