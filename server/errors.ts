/** Failures that the person can do something about, each with its status and its stable code. */
import type { DraftState } from "../shared/schemas/notebooks";
import type { ProblemIssue } from "../shared/schemas/problem";

export class AppError extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    readonly title: string,
    message: string,
    /** Further members of the problem document. */
    readonly members: { issues?: ProblemIssue[]; current?: DraftState } = {},
  ) {
    super(message);
    this.name = "AppError";
  }
}

export const signedOut = () =>
  new AppError(401, "signed_out", "Signed out", "Sign in to go on; an earlier sign-in may have lapsed.");

export const wrongCredentials = () =>
  new AppError(
    401,
    "wrong_credentials",
    "Not signed in",
    "The e-mail address or the password is not right. Check both and try again.",
  );

export const notFound = (what: string) =>
  new AppError(404, "not_found", "Not found", `There is no such ${what}, or you may not see it.`);

/** `act` completes "You may not …". */
export const forbidden = (act: string) =>
  new AppError(403, "forbidden", "Not allowed", `You may not ${act}. Ask the owner or the group's lead.`);

export const crossOrigin = () =>
  new AppError(
    403,
    "cross_origin",
    "Not allowed",
    "Changes are taken only from Tenuity's own pages. Open Tenuity itself and try again.",
  );

export const conflict = (code: string, detail: string, issues?: ProblemIssue[]) =>
  new AppError(409, code, "Not possible as things stand", detail, issues ? { issues } : {});

export const archived = () =>
  conflict(
    "archived",
    "This notebook is archived, to be read only. Its owner can take it out of the archive to go on.",
  );

export const invitationUnknown = () =>
  new AppError(
    404,
    "not_found",
    "Not found",
    "There is no invitation behind this link, or a newer letter has replaced it. Look for the last one.",
  );

export const invitationUsed = () =>
  conflict("invitation_used", "This invitation was accepted already; it is good once. Sign in to go on.");

export const invitationRevoked = () =>
  conflict("invitation_revoked", "This invitation was taken back. Ask whoever sent it.");

export const invitationLapsed = () =>
  conflict("invitation_lapsed", "This invitation is over. Ask whoever sent it to send it again.");

export const invitationForAnother = (email: string) =>
  new AppError(
    403,
    "invitation_for_another",
    "For another address",
    `This invitation is for ${email}. Sign in with that address, or ask to be invited by yours.`,
  );

export const staleRevision = (current: DraftState) =>
  new AppError(
    409,
    "stale_revision",
    "The draft has moved on",
    `This change was made on an older draft; the current one is revision ${current.revision}, saved by ${current.savedBy.name}. Compare the two and save again.`,
    { current },
  );

export const invalid = (detail: string, issues: ProblemIssue[], code = "invalid") =>
  new AppError(422, code, "Something needs correcting", detail, { issues });

export const evaluationFailed = (detail: string) =>
  new AppError(422, "evaluation_failed", "The notebook could not be computed", detail);
