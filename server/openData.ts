import path from "node:path";
import { openPglite, openPostgres, type Db, type OpenDatabase } from "./db/client";
import type { Env } from "./env";
import { takeFolderLock } from "./folderLock";
import { places } from "./places";

export interface OpenData {
  db: Db;
  close(): Promise<void>;
}

/**
 * The database of these settings, at its latest migration.
 *
 * @throws Error if another process has the data folder, or the database cannot be opened
 */
export async function openData(env: Pick<Env, "databaseUrl" | "dataFolder">): Promise<OpenData> {
  if (env.databaseUrl) return migrated(openPostgres(env.databaseUrl), () => undefined);
  const lock = takeFolderLock(env.dataFolder);
  try {
    return await migrated(await openPglite({ folder: path.join(env.dataFolder, "postgres") }), lock.release);
  } catch (error) {
    lock.release();
    throw error;
  }
}

async function migrated(database: OpenDatabase, release: () => void): Promise<OpenData> {
  await database.migrate(places.migrations);
  return {
    db: database.db,
    close: async () => {
      await database.close();
      release();
    },
  };
}
