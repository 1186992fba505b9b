import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import {
  groupListResponse,
  groupResponse,
  memberNotebooks,
  type CreateGroupBody,
} from "../../../shared/schemas/groups";
import { groupInvitationList, type InviteToGroupBody } from "../../../shared/schemas/invitations";
import type { GroupRole } from "../../../shared/schemas/roles";
import { api } from "../../lib/api";

/** The groups one is in. */
export const groupsQuery = queryOptions({
  queryKey: ["groups"],
  queryFn: ({ signal }) => api.get("/groups", groupListResponse, { signal }),
  staleTime: 60_000,
});

export const groupQuery = (id: string) =>
  queryOptions({
    queryKey: ["groups", id],
    queryFn: ({ signal }) => api.get(`/groups/${id}`, groupResponse, { signal }),
  });

/** The answer is the group as founded, of which only the id is needed before its page asks for the rest. */
const foundedGroup = z.object({ id: z.string() });

export function useFoundGroup() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: (body: CreateGroupBody) => api.post("/groups", body, foundedGroup),
    onSuccess: () => queryClient.invalidateQueries({ queryKey: groupsQuery.queryKey }),
  });
}

/** Changes to who is in a group. Whatever the answer, the lists of groups and members are asked for anew. */
function useMembershipChange<Input>(change: (input: Input) => Promise<unknown>) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSettled: () => queryClient.invalidateQueries({ queryKey: groupsQuery.queryKey }),
  });
}

export const useRenameGroup = (groupId: string) =>
  useMembershipChange((name: string) => api.patch(`/groups/${groupId}`, { name }, z.unknown()));

export const useSetMemberRole = (groupId: string) =>
  useMembershipChange(({ userId, role }: { userId: string; role: GroupRole }) =>
    api.patch(`/groups/${groupId}/members/${userId}`, { role }, z.unknown()),
  );

export const useRemoveMember = (groupId: string) =>
  useMembershipChange((userId: string) => api.delete(`/groups/${groupId}/members/${userId}`));

/** Gives one's own part as lead to another member. */
export const useHandOverLead = (groupId: string) =>
  useMembershipChange((userId: string) => api.post(`/groups/${groupId}/hand-over`, { userId }, z.unknown()));

/** How many notebooks a member leaves behind, and to whom they go. */
export const memberNotebooksQuery = (groupId: string, userId: string) =>
  queryOptions({
    queryKey: ["groups", groupId, "members", userId, "notebooks"],
    queryFn: ({ signal }) =>
      api.get(`/groups/${groupId}/members/${userId}/notebooks`, memberNotebooks, { signal }),
    staleTime: 0,
  });

/** Invitations without an answer yet, for leads. */
export const invitationsQuery = (groupId: string) =>
  queryOptions({
    queryKey: ["groups", groupId, "invitations"],
    queryFn: ({ signal }) => api.get(`/groups/${groupId}/invitations`, groupInvitationList, { signal }),
  });

export const useInvite = (groupId: string) =>
  useMembershipChange((body: InviteToGroupBody) =>
    api.post(`/groups/${groupId}/invitations`, body, z.unknown()),
  );

export const useInviteAgain = (groupId: string) =>
  useMembershipChange((id: string) =>
    api.post(`/groups/${groupId}/invitations/${id}/send-again`, {}, z.unknown()),
  );

export const useSetInvitedRole = (groupId: string) =>
  useMembershipChange(({ id, role }: { id: string; role: GroupRole }) =>
    api.patch(`/groups/${groupId}/invitations/${id}`, { role }, z.unknown()),
  );

export const useRevokeInvitation = (groupId: string) =>
  useMembershipChange((id: string) => api.delete(`/groups/${groupId}/invitations/${id}`));
