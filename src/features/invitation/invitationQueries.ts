import { queryOptions } from "@tanstack/react-query";
import { invitationResponse } from "../../../shared/schemas/invitations";
import { api } from "../../lib/api";

/** What the link with this token offers. */
export const invitationQuery = (token: string) =>
  queryOptions({
    queryKey: ["invitation", token],
    queryFn: ({ signal }) => api.post("/invitations/look", { token }, invitationResponse, { signal }),
    staleTime: 0,
    retry: false,
  });
