/**
 * Fills the database with the demonstration: an invented group, its people and their notebooks. Run it with
 * `npm run seed` while the server is stopped; where the demonstration is there already it changes nothing.
 */
import { pino } from "pino";
import { seedDemo } from "../server/demo/seedDemo";
import { linkOriginOf, readEnv } from "../server/env";
import { createEvaluator } from "../server/jobs/evaluator";
import { createSummaries } from "../server/jobs/summaries";
import { openData } from "../server/openData";

try {
  const env = readEnv(process.env);
  const data = await openData(env);
  const evaluator = createEvaluator();
  const summaries = createSummaries({ db: data.db, evaluator, logger: pino({ level: env.logLevel }) });
  const isNew = await seedDemo(data.db, {
    evaluator,
    now: new Date(),
    linkOrigin: linkOriginOf(env),
  });
  await summaries.catchUp();
  await summaries.idle();
  await summaries.close();
  await evaluator.close();
  await data.close();
  process.stdout.write(
    isNew ? "The demonstration is in place.\n" : "The demonstration was in place already.\n",
  );
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
}
