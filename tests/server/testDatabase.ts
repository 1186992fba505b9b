import { createHash, randomUUID } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { sql } from "drizzle-orm";
import { openPglite, openPostgres, type OpenDatabase } from "../../server/db/client";
import { places } from "../../server/places";

const cache = path.resolve(import.meta.dirname, "../../node_modules/.cache/tenuity");

/** A PostgreSQL server to run the tests on instead of PGlite: `TENUITY_TEST_DATABASE_URL=postgres://… npm run unit`. */
const serverUrl = process.env.TENUITY_TEST_DATABASE_URL;

/**
 * A database of its own at the latest migration. In memory, the first run migrates and keeps the state and later ones
 * load it; on a server it is made anew.
 */
export async function openTestDatabase(): Promise<OpenDatabase> {
  return serverUrl ? openServerDatabase(serverUrl) : openPglite({ dump: await migratedState() });
}

async function openServerDatabase(url: string): Promise<OpenDatabase> {
  const name = `tenuity_test_${randomUUID().replaceAll("-", "")}`;
  const server = openPostgres(url);
  await server.db.execute(sql`create database ${sql.identifier(name)}`);
  const database = openPostgres(Object.assign(new URL(url), { pathname: `/${name}` }).href);
  await database.migrate(places.migrations);
  return {
    ...database,
    close: async () => {
      await database.close();
      await server.db.execute(sql`drop database ${sql.identifier(name)}`);
      await server.close();
    },
  };
}

/** The same in a folder, closed again, so that a server need not make one from nothing. */
export async function makeDatabaseFolder(folder: string): Promise<void> {
  const database = await openPglite({ folder, dump: await migratedState() });
  await database.close();
}

async function migratedState(): Promise<Blob> {
  const file = path.join(cache, `migrated-${migrationsHash()}.tar`);
  if (!existsSync(file)) await writeDump(file);
  return new Blob([readFileSync(file)]);
}

function migrationsHash(): string {
  const hash = createHash("sha256");
  for (const name of readdirSync(places.migrations)
    .filter((name) => name.endsWith(".sql"))
    .sort()) {
    hash.update(name).update(readFileSync(path.join(places.migrations, name)));
  }
  return hash.digest("hex").slice(0, 16);
}

async function writeDump(file: string): Promise<void> {
  const database = await openPglite();
  await database.migrate(places.migrations);
  const dump = await database.client.dumpDataDir("none");
  await database.close();
  mkdirSync(cache, { recursive: true });
  // Several test files may come here at once; each writes its own and the last one stays.
  const own = `${file}.${process.pid}`;
  writeFileSync(own, Buffer.from(await dump.arrayBuffer()));
  renameSync(own, file);
}
