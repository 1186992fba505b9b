import { createHash, randomBytes } from "node:crypto";

/** A new token for the link of an invitation, with what is kept of it. */
export function newInvitationToken(): { token: string; tokenHash: string } {
  const token = randomBytes(32).toString("base64url");
  return { token, tokenHash: hashOfToken(token) };
}

/** SHA-256, in hexadecimal: 256 random bits cannot be searched backwards. */
export function hashOfToken(token: string): string {
  return createHash("sha256").update(token).digest("hex");
}
