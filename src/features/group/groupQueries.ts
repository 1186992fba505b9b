import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import {
  groupListResponse,
  groupResponse,
  type AddMemberBody,
  type CreateGroupBody,
} from "../../../shared/schemas/groups";
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

export const useAddMember = (groupId: string) =>
  useMembershipChange((body: AddMemberBody) => api.post(`/groups/${groupId}/members`, body, z.unknown()));

export const useSetMemberRole = (groupId: string) =>
  useMembershipChange(({ userId, role }: { userId: string; role: GroupRole }) =>
    api.patch(`/groups/${groupId}/members/${userId}`, { role }, z.unknown()),
  );

export const useRemoveMember = (groupId: string) =>
  useMembershipChange((userId: string) => api.delete(`/groups/${groupId}/members/${userId}`));
