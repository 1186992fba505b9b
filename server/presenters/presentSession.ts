import type { DemoAccount, SessionResponse } from "../../shared/schemas/session";
import type { Actor } from "../policies/actor";

export function presentSession(actor: Actor | null, demo: readonly DemoAccount[] | null): SessionResponse {
  return {
    user: actor && { id: actor.id, name: actor.name, email: actor.email },
    demo: demo && [...demo],
  };
}
