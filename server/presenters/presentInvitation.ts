import type {
  GroupInvitation,
  InvitationResponse,
  NotebookInvitation,
} from "../../shared/schemas/invitations";
import type { GroupRole, ShareRole } from "../../shared/schemas/roles";
import type { InvitationRow, OpenInvitationRow } from "../db/reads/findInvitation";

const presentOpen = (row: OpenInvitationRow, now: Date) => ({
  id: row.id,
  email: row.email,
  invitedBy: { id: row.invitedById, name: row.invitedByName },
  invitedAt: row.createdAt.toISOString(),
  expiresAt: row.expiresAt.toISOString(),
  hasLapsed: row.expiresAt <= now,
});

export const presentGroupInvitation = (row: OpenInvitationRow, now: Date): GroupInvitation => ({
  ...presentOpen(row, now),
  role: row.role as GroupRole,
});

export const presentNotebookInvitation = (row: OpenInvitationRow, now: Date): NotebookInvitation => ({
  ...presentOpen(row, now),
  role: row.role as ShareRole,
});

/** For whoever holds the link. */
export function presentInvitation(row: InvitationRow): InvitationResponse {
  return {
    to: row.groupId !== null ? "group" : "notebook",
    name: row.groupName ?? row.notebookTitle ?? "",
    role: row.role,
    email: row.email,
    invitedBy: row.invitedByName,
    expiresAt: row.expiresAt.toISOString(),
  };
}
