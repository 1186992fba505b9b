// Entry of the thread that computes parts of a task from the sources, which a thread does not read by itself.
import { register } from "tsx/esm/api";

register();
await import("./taskWorker.ts");
