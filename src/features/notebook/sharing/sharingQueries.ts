import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import { z } from "zod";
import type { ShareRole } from "../../../../shared/schemas/roles";
import { sharesResponse, type ShareBody } from "../../../../shared/schemas/shares";
import { api } from "../../../lib/api";
import { notebookQuery } from "../notebookQueries";

export const sharesQuery = (id: string) =>
  queryOptions({
    queryKey: ["notebook", id, "shares"],
    queryFn: ({ signal }) => api.get(`/notebooks/${id}/shares`, sharesResponse, { signal }),
  });

/** Changes to who may see a notebook. Whatever the answer, what they touch is asked for anew. */
function useSharesChange<Input>(id: string, change: (input: Input) => Promise<unknown>) {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: change,
    onSettled: () => {
      void queryClient.invalidateQueries({ queryKey: sharesQuery(id).queryKey });
      void queryClient.invalidateQueries({ queryKey: notebookQuery(id).queryKey, exact: true });
      void queryClient.invalidateQueries({ queryKey: ["notebooks"] });
    },
  });
}

export const useShare = (id: string) =>
  useSharesChange(id, (body: ShareBody) => api.post(`/notebooks/${id}/shares`, body, sharesResponse));

export const useSetShareRole = (id: string) =>
  useSharesChange(id, ({ userId, role }: { userId: string; role: ShareRole }) =>
    api.patch(`/notebooks/${id}/shares/${userId}`, { role }, sharesResponse),
  );

export const useTakeBackShare = (id: string) =>
  useSharesChange(id, (userId: string) => api.delete(`/notebooks/${id}/shares/${userId}`));

/** null takes the share with the group back. */
export const useSetGroupShare = (id: string) =>
  useSharesChange(id, (role: ShareRole | null) =>
    api.put(`/notebooks/${id}/group-share`, { role }, sharesResponse),
  );

export const useInviteAgain = (id: string) =>
  useSharesChange(id, (invitationId: string) =>
    api.post(`/notebooks/${id}/invitations/${invitationId}/send-again`, {}, sharesResponse),
  );

export const useSetInvitedRole = (id: string) =>
  useSharesChange(id, ({ invitationId, role }: { invitationId: string; role: ShareRole }) =>
    api.patch(`/notebooks/${id}/invitations/${invitationId}`, { role }, sharesResponse),
  );

export const useRevokeInvitation = (id: string) =>
  useSharesChange(id, (invitationId: string) => api.delete(`/notebooks/${id}/invitations/${invitationId}`));

export const useHandOverNotebook = (id: string) =>
  useSharesChange(id, (userId: string) => api.post(`/notebooks/${id}/hand-over`, { userId }, z.unknown()));
