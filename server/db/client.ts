/** The database: PGlite in a folder, PGlite in memory for tests, or a PostgreSQL server. */
import { PGlite } from "@electric-sql/pglite";
import { drizzle as drizzleNodePostgres } from "drizzle-orm/node-postgres";
import { migrate as migrateNodePostgres } from "drizzle-orm/node-postgres/migrator";
import type { PgDatabase, PgQueryResultHKT } from "drizzle-orm/pg-core";
import { drizzle as drizzlePglite } from "drizzle-orm/pglite";
import { migrate as migratePglite } from "drizzle-orm/pglite/migrator";
import pg from "pg";

/** A database or a transaction of it, whichever engine is behind. */
export type Db = PgDatabase<PgQueryResultHKT>;

export interface OpenDatabase {
  db: Db;
  migrate(folder: string): Promise<void>;
  close(): Promise<void>;
}

/** A PostgreSQL server, by its connection string. */
export function openPostgres(url: string): OpenDatabase {
  const pool = new pg.Pool({ connectionString: url, max: 10 });
  const db = drizzleNodePostgres(pool);
  return {
    db,
    migrate: (folder) => migrateNodePostgres(db, { migrationsFolder: folder }),
    close: () => pool.end(),
  };
}

/**
 * PGlite in a folder of its own, or in memory where there is none; `dump` is a state to begin with.
 * The caller makes sure that no other process has the folder open: PGlite would not notice and would lose rows.
 */
export async function openPglite(
  options: { folder?: string; dump?: Blob } = {},
): Promise<OpenDatabase & { client: PGlite }> {
  const client = await PGlite.create(options.folder, options.dump ? { loadDataDir: options.dump } : {});
  const db = drizzlePglite(client);
  return {
    db,
    client,
    migrate: (folder) => migratePglite(db, { migrationsFolder: folder }),
    close: () => client.close(),
  };
}
