import type { SharesResponse } from "../../shared/schemas/shares";
import type { OpenInvitationRow } from "../db/reads/findInvitation";
import type { NotebookRow } from "../db/reads/findNotebook";
import type { ShareRow } from "../db/reads/listShares";
import { presentNotebookInvitation } from "./presentInvitation";

export function presentShares(
  notebook: NotebookRow,
  parts: {
    shares: ShareRow[];
    invitations: OpenInvitationRow[];
    members: { people: number; guests: number } | null;
    now: Date;
  },
): SharesResponse {
  const { shares, invitations, members, now } = parts;
  return {
    owner: { id: notebook.ownerId, name: notebook.ownerName },
    people: shares.map(({ userId, name, role, createdAt, groupRole }) => ({
      user: { id: userId, name },
      role,
      since: createdAt.toISOString(),
      groupRole,
    })),
    invitations: invitations.map((row) => presentNotebookInvitation(row, now)),
    group:
      members !== null && notebook.groupId !== null && notebook.groupName !== null
        ? { id: notebook.groupId, name: notebook.groupName, role: notebook.groupRole, ...members }
        : null,
  };
}
