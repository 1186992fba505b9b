import type { Logger } from "pino";
import { engineVersion } from "../../shared/notebook/engine";
import { storeDrift } from "../commands/changeReference";
import type { Db } from "../db/client";
import { findPinned, listToRecompute } from "../db/reads/findReference";
import { presentSupplied } from "../presenters/presentReference";
import { driftOf } from "../vetting/recompute";
import type { Evaluator } from "./evaluator";

/**
 * Computes the references that were published with another engine again, and stores how far they drift. What was
 * published stays. Acts for the server itself, so it sees what each rests on.
 */
export async function recomputeReferences(parts: {
  db: Db;
  evaluator: Evaluator;
  logger: Logger;
  engine?: string;
}): Promise<void> {
  const { db, evaluator, logger, engine = engineVersion } = parts;
  for (const { id, document, result, restsOn } of await listToRecompute(db, engine)) {
    const references = (await findPinned(db, restsOn, null)).map(presentSupplied);
    const answer = await evaluator.evaluate(document, { isKept: true, references });
    if (!answer.ok) logger.warn({ reference: id, reason: answer.reason }, "a reference could not be recomputed");
    await storeDrift(db, { id, engine, drift: driftOf(result, answer), at: new Date() });
  }
}
