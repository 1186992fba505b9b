import type { ActDetails, ActName, ActSubject } from "../../shared/schemas/audit";
import type { Db } from "../db/client";
import { acts } from "../db/tables/acts";

export interface Act {
  at: Date;
  /** Whose leads may read of it; null on somebody's own shelf. */
  groupId: string | null;
  actorId: string;
  act: ActName;
  subject: ActSubject;
  subjectId: string;
  subjectName: string;
  details?: ActDetails;
}

/** Writes a line of the audit trail. Call it in the transaction of what it tells, so that neither is without the other. */
export async function recordAct(tx: Db, { details = {}, ...act }: Act): Promise<void> {
  await tx.insert(acts).values({ ...act, details });
}
