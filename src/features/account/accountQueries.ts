import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { CreateAccountBody } from "../../../shared/schemas/accounts";
import { sessionResponse, type SessionResponse, type SignInBody } from "../../../shared/schemas/session";
import { api } from "../../lib/api";
import { sessionQuery } from "../../lib/session";

/** Signs in by password, or as a demonstration account by its address alone. */
export function useSignIn(onSignedIn: (session: SessionResponse) => void) {
  return useMutation({
    mutationFn: (body: SignInBody | { email: string }) =>
      "password" in body
        ? api.post("/session", body, sessionResponse)
        : api.post("/session/demo", body, sessionResponse),
    onSuccess: onSignedIn,
  });
}

/** A new account, signed in at once. */
export function useCreateAccount(onSignedIn: (session: SessionResponse) => void) {
  return useMutation({
    mutationFn: (body: CreateAccountBody) => api.post("/accounts", body, sessionResponse),
    onSuccess: onSignedIn,
  });
}

/** Ends the session here. What the pages knew goes with it. */
export function useSignOut() {
  const queryClient = useQueryClient();
  return useMutation({
    mutationFn: () => api.delete("/session"),
    onSuccess: () => {
      queryClient.setQueryData(sessionQuery.queryKey, (session) => ({
        user: null,
        demo: session?.demo ?? null,
      }));
      queryClient.removeQueries({ predicate: (query) => query.queryKey[0] !== "session" });
    },
  });
}
