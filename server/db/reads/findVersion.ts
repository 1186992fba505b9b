import { and, desc, eq } from "drizzle-orm";
import type { Db } from "../client";
import { users } from "../tables/users";
import { versions } from "../tables/versions";

const headColumns = {
  number: versions.number,
  message: versions.message,
  keptAt: versions.keptAt,
  keptById: versions.keptBy,
  keptByName: users.name,
  engine: versions.engine,
  contentHash: versions.contentHash,
};

/** Newest first. */
export async function listVersions(db: Db, notebookId: string) {
  return db
    .select(headColumns)
    .from(versions)
    .innerJoin(users, eq(users.id, versions.keptBy))
    .where(eq(versions.notebookId, notebookId))
    .orderBy(desc(versions.number));
}

export async function findVersion(db: Db, notebookId: string, number: number) {
  const [version] = await db
    .select({ ...headColumns, document: versions.document, result: versions.result })
    .from(versions)
    .innerJoin(users, eq(users.id, versions.keptBy))
    .where(and(eq(versions.notebookId, notebookId), eq(versions.number, number)));
  return version;
}

export type VersionHeadRow = Awaited<ReturnType<typeof listVersions>>[number];
export type VersionRow = NonNullable<Awaited<ReturnType<typeof findVersion>>>;
