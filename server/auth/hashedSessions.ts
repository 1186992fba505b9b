import { createHash } from "node:crypto";
import type { Adapter } from "lucia";

const hashOf = (sessionId: string): string => createHash("sha256").update(sessionId).digest("hex");

/**
 * An adapter that hands on only the SHA-256 of a session id, so that a copy of the database opens no session.
 * The ids have 200 random bits: a plain hash cannot be searched backwards.
 */
export function hashedSessions(adapter: Adapter): Adapter {
  return {
    getSessionAndUser: async (sessionId) => {
      const [session, user] = await adapter.getSessionAndUser(hashOf(sessionId));
      // Lucia renews and ends a session under the id found here, which must be the one that will be hashed again.
      return [session && { ...session, id: sessionId }, user];
    },
    getUserSessions: (userId) => adapter.getUserSessions(userId),
    setSession: (session) => adapter.setSession({ ...session, id: hashOf(session.id) }),
    updateSessionExpiration: (sessionId, expiresAt) =>
      adapter.updateSessionExpiration(hashOf(sessionId), expiresAt),
    deleteSession: (sessionId) => adapter.deleteSession(hashOf(sessionId)),
    deleteUserSessions: (userId) => adapter.deleteUserSessions(userId),
    deleteExpiredSessions: () => adapter.deleteExpiredSessions(),
  };
}
