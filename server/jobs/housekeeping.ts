import type { Logger } from "pino";
import type { Auth } from "../auth/auth";
import { emptyBin } from "../commands/emptyBin";
import type { Db } from "../db/client";

const everySixHours = 6 * 3_600_000;

/** Empties the bin of what has been there 30 days and forgets sessions that have lapsed; now and every six hours. */
export function startHousekeeping(parts: { db: Db; auth: Auth; logger: Logger }): { stop(): void } {
  const { db, auth, logger } = parts;
  const keepHouse = async (): Promise<void> => {
    const gone = await emptyBin(db, { at: new Date() });
    if (gone > 0) logger.info({ notebooks: gone }, "removed notebooks that were in the bin for 30 days");
    await auth.sweepExpired();
  };
  const run = (): void => {
    keepHouse().catch((error: unknown) => logger.error({ err: error }, "housekeeping failed"));
  };
  run();
  const timer = setInterval(run, everySixHours);
  timer.unref();
  return { stop: () => clearInterval(timer) };
}
