import { createNotebook } from "../../server/commands/createNotebook";
import { keepVersion } from "../../server/commands/keepVersion";
import { shareWithGroup } from "../../server/commands/shareWithGroup";
import { shareWithPerson } from "../../server/commands/shareWithPerson";
import type { Db } from "../../server/db/client";
import { evaluateDocument } from "../../server/jobs/evaluateDocument";
import type { Actor } from "../../server/policies/actor";
import type { NotebookDocument } from "../../shared/notebook/document";
import type { ShareRole } from "../../shared/schemas/roles";
import { buildDocument } from "./buildDocument";

export interface BuiltNotebook {
  id: string;
  owner: Actor;
  document: NotebookDocument;
}

/** A notebook at revision 1, shared as said, with a version kept for each message. */
export async function buildNotebook(
  db: Db,
  parts: {
    owner: Actor;
    document?: NotebookDocument;
    groupId?: string | null;
    groupRole?: ShareRole;
    shares?: [Actor, ShareRole][];
    versions?: string[];
  },
): Promise<BuiltNotebook> {
  const at = new Date("2026-10-03T08:00:00Z");
  const { owner, document = buildDocument(), groupId = null, groupRole, shares = [], versions = [] } = parts;
  const { id } = await createNotebook(db, { ownerId: owner.id, groupId, document, at });
  const share = { notebookId: id, letter: null, actorId: owner.id, at };
  if (groupRole) await shareWithGroup(db, { ...share, role: groupRole });
  for (const [user, role] of shares) await shareWithPerson(db, { ...share, user, role });
  for (const message of versions) {
    const { result } = evaluateDocument(document);
    await keepVersion(db, { notebookId: id, revision: 1, message, result, actorId: owner.id, at });
  }
  return { id, owner, document };
}
