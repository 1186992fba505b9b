import { createHash } from "node:crypto";
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import path from "node:path";
import { openPglite } from "../../server/db/client";
import { places } from "../../server/places";

const cache = path.resolve(import.meta.dirname, "../../node_modules/.cache/tenuity");

/** A database in memory at the latest migration. The first run migrates and keeps the state; later ones load it. */
export async function openTestDatabase() {
  return openPglite({ dump: await migratedState() });
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
